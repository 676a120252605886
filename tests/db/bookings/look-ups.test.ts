import { beforeAll, describe, expect, it } from 'vitest';
import { countLookUp } from '@/lib/bookings/access';
import { addMinutes } from '@/lib/core/time';
import { aClub, ctxOf, NOON } from '@/tests/support/cast';
import { refusalOf } from './hold-cast';

const stranger = { kind: 'anyone' as const };

describe('looking up private links', () => {
  beforeAll(() => aClub());

  it('ends for one client after 120 in ten minutes, goes on for another, and begins again later', async () => {
    const ctx = { ...(await ctxOf(stranger)), client: 'one client' };
    for (let tries = 0; tries < 120; tries += 1) await countLookUp(ctx);

    expect(await refusalOf(countLookUp(ctx))).toBe('too_many_tries');
    expect(await refusalOf(countLookUp({ ...ctx, client: 'another' }))).toBe('done');
    expect(await refusalOf(countLookUp({ ...ctx, now: addMinutes(NOON, 10) }))).toBe('done');
  });
});
