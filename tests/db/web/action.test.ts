import { sql } from 'drizzle-orm';
import { inspect } from 'node:util';
import { beforeAll, describe, expect, it, vi } from 'vitest';
import { z } from 'zod';
import { asBrowser, frameworkHeaders } from '@/tests/support/request';
import { getDb } from '@/db/client';
import { Refusal } from '@/lib/core/refusal';
import { action } from '@/lib/web/action';
import { aClub } from '../../support/cast';

vi.mock('next/headers', () => frameworkHeaders());
beforeAll(() => aClub());

/** What a run of `work` wrote to the log, and the error it ended in. */
async function ended(work: () => Promise<unknown>) {
  const said = console.error;
  const lines: string[] = [];
  console.error = (line: string) => lines.push(line);
  const error: unknown = await work().then(() => null, (thrown: unknown) => thrown).finally(() => { console.error = said; });
  return { error, lines };
}

describe('an action that breaks', () => {
  it('crashes to the error page with one line in the log, and nothing of what was typed in either', async () => {
    const broken = action({ requires: 'anyone', input: z.object({}), run: () => getDb().execute(sql`select ${'12 Secret Lane'}::integer`) });

    const { error, lines } = await ended(() => asBrowser({}, () => broken({ status: 'idle' }, new FormData())));

    expect(error).toBeInstanceOf(Error);
    expect(lines.map((line) => JSON.parse(line))).toMatchObject([{ operation: 'action failed', code: '22P02' }]);
    expect(inspect(error, { depth: 9 }) + lines.join('')).not.toContain('Secret Lane'); // the framework prints what is thrown
  });

  it('that says no is answered in words', async () => {
    const refused = action({ requires: 'anyone', input: z.object({}), run: async () => { throw new Refusal('busy'); } });

    expect(await asBrowser({}, () => refused({ status: 'idle' }, new FormData()))).toMatchObject({ status: 'refused', code: 'busy' });
  });
});
