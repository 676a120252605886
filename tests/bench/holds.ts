import { randomBytes, randomInt } from 'node:crypto';
import { startTestStack } from '../support/stack';
import { rounded, type Bench } from './bench';
import { aBenchDay, oversoldIn, type BenchDay } from './bench-day';
import { clientOf, compare, rateOf, type Answer } from './load';

export const describe: Bench['describe'] = 'Holds of two of 144 entry times by 64 visitors at once, beside a handler that runs select 1';

const CONNECTIONS = 64;
const SLICES = 5;
const SLICE_MS = 4000;
const ASKED_FROM_ONE_ADDRESS = 50; // the limiter allows 60 in ten minutes; then the next visitor comes

/** Two gardens at least three hours apart, which every party can reach. */
function pairOf({ times }: BenchDay): string[] {
  const start = randomInt(0, 6);
  const first = randomInt(0, times.length);
  const second = (first + randomInt(1, times.length)) % times.length;
  return [times[first]?.[start] ?? '', times[second]?.[randomInt(start + 6, 12)] ?? ''];
}

const bodyOf = (openDayId: string, ids: readonly string[]) =>
  JSON.stringify({ openDayId, insists: false, wanted: ids.map((entryTimeId) => ({ entryTimeId, adults: 1, children: 0, babes: 0 })) });

/** Measures holds beside the bare handler, on many entry times and on a single one; then looks whether every figure agrees. */
export const run: Bench['run'] = async () => {
  const stack = await startTestStack({ name: 'bench-holds', seeded: true, more: { TRUSTED_PROXY_HOPS: '1' } });
  const client = clientOf(stack.site, CONNECTIONS);
  try {
    const day = await aBenchDay(stack.database.ADMIN_DATABASE_URL);
    const sent = Array.from({ length: CONNECTIONS }, () => 0);
    const browsers = Array.from({ length: CONNECTIONS }, () => randomBytes(32).toString('base64url'));
    const ends = new Map<number, number>();
    const headersOf = (connection: number) => {
      const visitor = Math.floor((sent[connection] ?? 0) / ASKED_FROM_ONE_ADDRESS);
      sent[connection] = (sent[connection] ?? 0) + 1;
      return { 'content-type': 'application/json', origin: stack.site, 'x-forwarded-for': `10.${connection}.${visitor >> 8}.${visitor & 255}` };
    };
    const note = (answer: Answer) => ends.set(answer.status, (ends.get(answer.status) ?? 0) + 1);
    const hold = async (connection: number) => {
      note(await client.send({ method: 'POST', path: '/api/holds', headers: headersOf(connection), body: bodyOf(day.openDayId, pairOf(day)) }));
    };
    const holdHot = async (connection: number) => {
      const headers = { ...headersOf(connection), cookie: `hold=${browsers[connection] ?? ''}` };
      note(await client.send({ method: 'POST', path: '/api/holds', headers, body: bodyOf(day.openDayId, [day.times[0]?.[11] ?? '']) }));
    };
    const bare = async (connection: number) => {
      await client.send({ method: 'POST', path: '/api/bench', headers: headersOf(connection), body: bodyOf(day.openDayId, pairOf(day)) });
    };
    const many = await compare(SLICES, () => rateOf(CONNECTIONS, SLICE_MS, hold), () => rateOf(CONNECTIONS, SLICE_MS, bare));
    const hot = await compare(3, () => rateOf(CONNECTIONS, SLICE_MS, holdHot), () => rateOf(CONNECTIONS, SLICE_MS, bare));
    const failures = [...ends].filter(([status]) => status !== 200 && status !== 409);
    const broken = failures.filter(([status]) => status >= 500).reduce((sum, [, count]) => sum + count, 0);
    const limited = failures.filter(([status]) => status < 500).reduce((sum, [, count]) => sum + count, 0);
    const oversold = await oversoldIn(stack.database.ADMIN_DATABASE_URL, day.openDayId);
    return {
      figures: {
        ratio: rounded(many.ratio, 3), oversold, deadlocks: broken, hot_ratio: rounded(hot.ratio, 3), holds_a_second: rounded(many.subject, 0), bare_a_second: rounded(many.bare, 0),
        hot_holds_a_second: rounded(hot.subject, 0), kept: ends.get(200) ?? 0, places_gone: ends.get(409) ?? 0, otherwise: limited,
      },
      bars: [
        { name: 'ratio', value: rounded(many.ratio, 3), min: 0.5 },
        { name: 'oversold', value: oversold, max: 0 },
        { name: 'deadlocks', value: broken, max: 0 },
        { name: 'otherwise', value: limited, max: 0 },
      ],
    };
  } finally {
    client.close();
    await stack.stop();
  }
};
