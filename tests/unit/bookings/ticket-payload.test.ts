import { createPrivateKey, createPublicKey, generateKeyPairSync, sign, verify, type KeyObject } from 'node:crypto';
import { existsSync, readFileSync } from 'node:fs';
import path from 'node:path';
import fc from 'fast-check';
import jsQR from 'jsqr';
import QRCode from 'qrcode';
import sharp from 'sharp';
import { describe, expect, it } from 'vitest';
import { z } from 'zod';
import { decodeTicket, encodeTicket, verifyTicket, type TicketFacts } from '@/lib/bookings/rules/ticket-payload';
import { fromBase32, toBase32 } from '@/lib/core/base32';

const keys = generateKeyPairSync('ed25519');
const signer = (bytes: Uint8Array) => sign(null, bytes, keys.privateKey);
const knows = (known: number, key: KeyObject = keys.publicKey) => (bytes: Uint8Array, signature: Uint8Array, keyId: number) =>
  keyId === known && verify(null, bytes, key, signature);

const facts: TicketFacts = {
  keyId: 7,
  clubId: '0b7a2f7e-5b0c-4a58-9d1c-6a1f7f2f0c11',
  visitId: 'f3c1b9a0-2d44-4c6e-8f5a-90ab12cd34ef',
  visitVersion: 3,
  stopId: '6d1e3f5a-7b9c-4d2e-8a4b-5c6d7e8f9a0b',
  stopNumber: 5,
  entryAt: new Date('2027-05-15T15:30:00Z'),
  graceMinutes: 20,
  adults: 2,
  children: 1,
  babes: 0,
};

const anyFacts = fc.record({
  keyId: fc.nat(0xffff), clubId: fc.uuid(), visitId: fc.uuid(), visitVersion: fc.nat(0xffff), stopId: fc.uuid(), stopNumber: fc.integer({ min: 1, max: 14 }),
  entryAt: fc.integer({ min: 0, max: 0xffff_ffff }).map((minutes) => new Date(minutes * 60_000)),
  graceMinutes: fc.nat(0xffff), adults: fc.nat(255), children: fc.nat(255), babes: fc.nat(255),
});

describe('Ed25519 as tickets use it', () => {
  // RFC 8032 section 7.1, tests 1 to 3: secret key, public key, message, signature.
  it.each([
    ['9d61b19deffd5a60ba844af492ec2cc44449c5697b326919703bac031cae7f60', 'd75a980182b10ab7d54bfed3c964073a0ee172f3daa62325af021a68f707511a', '',
      'e5564300c360ac729086e2cc806e828a84877f1eb8e5d974d873e065224901555fb8821590a33bacc61e39701cf9b46bd25bf5f0595bbe24655141438e7a100b'],
    ['4ccd089b28ff96da9db6c346ec114e0f5b8a319f35aba624da8cf6ed4fb8a6fb', '3d4017c3e843895a92b70aa74d1b7ebc9c982ccf2ec4968cc0cd55f12af4660c', '72',
      '92a009a9f0d4cab8720e820b5f642540a2b27b5416503f8fb3762223ebdb69da085ac1e43e15996e458f3613d0f11d8c387b2eaeb4302aeeb00d291612bb0c00'],
    ['c5aa8df43f9f837bedb7442f31dcb7b166d38535076f094b85ce3a2e0b4458f7', 'fc51cd8e6218a1a38da47ed00230f0580816ed13ba3303ac5deb911548908025', 'af82',
      '6291d657deec24024827e69c3abe01a30ce548a284743a445e3680d7db5ac3ac18ff9b538d16f290ae67f760984dc6594a7c15e9716ed28dc027beceea1ec40a'],
  ])('agrees with the published vector of key %s', (seed, publicKey, message, signature) => {
    // RFC 8410 section 7: an Ed25519 private key in PKCS #8 is this prefix and the 32-byte seed.
    const secret = createPrivateKey({ key: Buffer.from(`302e020100300506032b657004220420${seed}`, 'hex'), format: 'der', type: 'pkcs8' });
    const open = createPublicKey(secret);
    const bytes = Buffer.from(message, 'hex');

    expect(open.export({ format: 'jwk' }).x).toBe(Buffer.from(publicKey, 'hex').toString('base64url'));
    expect(sign(null, bytes, secret).toString('hex')).toBe(signature);
    expect(verify(null, bytes, open, Buffer.from(signature, 'hex'))).toBe(true);
  });
});

describe('what a ticket says', () => {
  it('comes back whole, for every ticket there can be', async () => {
    await fc.assert(
      fc.asyncProperty(anyFacts, async (ticket) => {
        expect(await verifyTicket(encodeTicket(ticket, signer), knows(ticket.keyId))).toEqual(ticket);
      }),
      { numRuns: 50 },
    );
  });

  it('is not ours after any single bit of it was changed', async () => {
    const bytes = fromBase32(encodeTicket(facts, signer)) ?? new Uint8Array();
    const taken: number[] = [];

    for (let bit = 0; bit < bytes.length * 8; bit += 1) {
      const forged = Uint8Array.from(bytes, (byte, at) => (at === bit >> 3 ? byte ^ (1 << (bit & 7)) : byte));
      if ((await verifyTicket(toBase32(forged), knows(facts.keyId))) !== null) taken.push(bit);
    }

    expect(bytes).toHaveLength(127);
    expect(taken).toEqual([]);
  });

  it('is not ours when another key signed it, or a key we do not know', async () => {
    const text = encodeTicket(facts, signer);

    expect(await verifyTicket(text, knows(7, generateKeyPairSync('ed25519').publicKey))).toBeNull();
    expect(await verifyTicket(text, knows(8))).toBeNull();
  });

  it('is not ours when it is longer, shorter, in small letters, or something else altogether', () => {
    const text = encodeTicket(facts, signer);

    for (const other of [`${text}A`, text.slice(0, -1), text.toLowerCase(), '', 'https://garden.example', ` ${text}`]) expect(decodeTicket(other)).toBeNull();
  });

  it.each([
    ['256 adults', { adults: 256 }], ['minus one child', { children: -1 }], ['half a babe', { babes: 0.5 }],
    ['a time between two minutes', { entryAt: new Date('2027-05-15T15:30:30Z') }], ['no visit', { visitId: 'none' }],
  ])('cannot be made for %s', (_, wrong) => {
    expect(() => encodeTicket({ ...facts, ...wrong }, signer)).toThrow(RangeError);
  });
});

describe('the QR of a ticket', () => {
  const text = encodeTicket(facts, signer);
  const capacities = path.resolve('..', 'shared', 'data', 'qr_capacity.json');

  it('uses only characters of the alphanumeric mode and needs version 8 or less at level M', () => {
    const code = QRCode.create(text, { errorCorrectionLevel: 'M' });

    expect(text).toMatch(/^[0-9A-Z $%*+\-./:]+$/);
    expect(code.version).toBeLessThanOrEqual(8);
    expect(code.segments).toHaveLength(1);
  });

  // The published table lies beside the project where it is checked; elsewhere this one check has nothing to read.
  it.runIf(existsSync(capacities))('fits what the published capacity table allows for version 8 at level M', () => {
    const table = z.object({ versions: z.record(z.string(), z.object({ M: z.tuple([z.number(), z.number(), z.number()]) })) });
    const { versions } = table.parse(JSON.parse(readFileSync(capacities, 'utf8')));

    expect(text.length).toBeLessThanOrEqual(versions['8']?.M[1] ?? 0);
  });

  it('is read by another program from a screen', async () => {
    const picture = await sharp(await QRCode.toBuffer(text, { errorCorrectionLevel: 'M', margin: 4, scale: 6 })).ensureAlpha().raw().toBuffer({ resolveWithObject: true });

    expect(jsQR(new Uint8ClampedArray(picture.data), picture.info.width, picture.info.height)?.data).toBe(text);
  });

  it('is read by another program from 32 mm of paper scanned at 150 dots an inch', async () => {
    const drawing = await QRCode.toString(text, { type: 'svg', errorCorrectionLevel: 'M', margin: 4 });
    const modules = QRCode.create(text, { errorCorrectionLevel: 'M' }).modules.size;
    const dots = Math.round((32 / 25.4) * 150 * ((modules + 8) / modules)); // 32 mm without the quiet zone
    const scan = await sharp(Buffer.from(drawing), { density: 600 }).resize(dots, dots, { kernel: 'cubic' }).blur(0.6).ensureAlpha().raw().toBuffer();

    expect(jsQR(new Uint8ClampedArray(scan), dots, dots)?.data).toBe(text);
  });
});
