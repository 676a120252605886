import type { Locator } from '@playwright/test';
import ICAL from 'ical.js';
import jsqr from 'jsqr';
import sharp from 'sharp';

/** Reads the QR that a page shows, with a decoder that the product does not use. */
export async function readQr(code: Locator): Promise<string> {
  const { data, info } = await sharp(await code.screenshot()).ensureAlpha().raw().toBuffer({ resolveWithObject: true });
  const read = jsqr(new Uint8ClampedArray(data), info.width, info.height);
  if (!read) throw new Error('the QR on the page cannot be read');
  return read.data;
}

export type Event = { uid: string; sequence: number; summary: string; location: string; start: string; method: string | null; status: string | null };

/** The events of a calendar file, as an independent parser reads them. */
export function eventsOf(text: string): Event[] {
  const calendar = new ICAL.Component(ICAL.parse(text));
  const method = calendar.getFirstPropertyValue('method');
  return calendar.getAllSubcomponents('vevent').map((event) => {
    const textOf = (name: string) => String(event.getFirstPropertyValue(name) ?? '');
    return {
      uid: textOf('uid'), sequence: Number(textOf('sequence')), summary: textOf('summary'), location: textOf('location'), start: textOf('dtstart'),
      method: method === null ? null : String(method), status: textOf('status') || null,
    };
  });
}
