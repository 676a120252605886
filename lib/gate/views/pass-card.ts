import QRCode from 'qrcode';
import type { FormState } from '@/lib/core/form-state';

/** A new gate pass as it is shown, once: its link, and the link as a code to hold a phone before. */
export type PassCard = { helper: string; garden: string; link: string; path: string; size: string };

/** The card of a pass. The pass stands in the fragment, which browsers keep from servers and logs (RFC 3986 section 3.5). */
export function toPassCard(pass: { helper: string; garden: string; secret: string }, siteUrl: string): PassCard {
  const link = new URL(`/gate#${pass.secret}`, siteUrl).href;
  const { data, size } = QRCode.create(link, { errorCorrectionLevel: 'M' }).modules;
  const dark = Array.from(data.keys()).filter((at) => data[at] === 1);
  const path = dark.map((at) => `M${(at % size) + QUIET} ${Math.floor(at / size) + QUIET}h1v1h-1z`).join('');
  return { helper: pass.helper, garden: pass.garden, link, path, size: String(size + 2 * QUIET) };
}

/** The quiet zone round a QR code, in modules (ISO/IEC 18004). */
const QUIET = 4;

/** The card in a form's state, or null. */
export function passCardOf({ fact }: FormState): PassCard | null {
  const { helper, garden, link, path, size } = fact ?? {};
  return helper === undefined || garden === undefined || link === undefined || path === undefined || size === undefined ? null : { helper, garden, link, path, size };
}
