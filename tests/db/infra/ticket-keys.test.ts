import { createPublicKey, verify } from 'node:crypto';
import { afterEach, describe, expect, it } from 'vitest';
import { getDb } from '@/db/client';
import { ticketKeys } from '@/db/schema/bookings';
import { only } from '@/lib/core/only';
import { forgetEnv } from '@/lib/infra/env';
import { ticketPublicKeys, ticketSigning } from '@/lib/infra/ticket-keys';
import { NOON } from '../../support/cast';

const secret = process.env['TICKET_KEY_SECRET'];
afterEach(() => {
  process.env['TICKET_KEY_SECRET'] = secret;
  forgetEnv();
});

describe('the club\'s ticket key', () => {
  it('is made once at the first need, even by two servers at once, and signs what its public half verifies', async () => {
    const [one, two] = await Promise.all([ticketSigning(getDb(), NOON), ticketSigning(getDb(), NOON)]);

    expect(two.keyId).toBe(one.keyId);
    expect(two.clubId).toBe(one.clubId);
    expect(one.clubId).toMatch(/^[0-9a-f]{8}-[0-9a-f]{4}-8[0-9a-f]{3}-[89ab][0-9a-f]{3}-[0-9a-f]{12}$/); // RFC 9562 section 5.8
    const { publicKey } = only(await ticketPublicKeys(getDb()));
    const key = createPublicKey({ key: { kty: 'OKP', crv: 'Ed25519', x: publicKey.toString('base64url') }, format: 'jwk' });
    const words = Buffer.from('Saltmarsh, 10:00, 3 people');
    expect(verify(null, words, key, one.sign(words))).toBe(true);
    expect(verify(null, Buffer.from('Saltmarsh, 10:00, 4 people'), key, one.sign(words))).toBe(false);
  });

  it('lies sealed in the database, and does not open with another secret', async () => {
    await ticketSigning(getDb(), NOON);
    const { sealed } = only(await getDb().select({ sealed: ticketKeys.sealedPrivateKey }).from(ticketKeys));
    process.env['TICKET_KEY_SECRET'] = 'some-other-secret-0123456789abcdef01';
    forgetEnv();

    expect(sealed.includes(Buffer.from('302e020100300506032b6570', 'hex'))).toBe(false); // how a bare PKCS #8 key begins (RFC 8410)
    await expect(ticketSigning(getDb(), NOON)).rejects.toThrow('TICKET_KEY_SECRET is not the one');
  });
});
