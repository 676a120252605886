import { startTestStack } from '../support/stack';
import { rounded, type Bench } from './bench';
import { aBenchDay } from './bench-day';
import { clientOf, compare, rateOf } from './load';

export const describe: Bench['describe'] = 'Places left of 12 gardens × 12 entry times, beside a GET handler that does nothing';

const CONNECTIONS = 64;
const SLICES = 5;
const SLICE_MS = 4000;

/** Measures the places-left route beside the bare handler. */
export const run: Bench['run'] = async () => {
  const stack = await startTestStack({ name: 'bench-board', seeded: true });
  const client = clientOf(stack.site, CONNECTIONS);
  try {
    const day = await aBenchDay(stack.database.ADMIN_DATABASE_URL);
    const path = `/api/board/${day.openDayId}`;
    const first = await client.send({ path });
    const answered: { places?: Record<string, number | null> } = JSON.parse(first.body);
    const shown = Object.keys(answered.places ?? {}).length;
    let wrong = first.status === 200 && shown === 144 ? 0 : 1;
    const ask = (address: string) => async () => {
      if ((await client.send({ path: address })).status !== 200) wrong += 1;
    };
    const { ratio, subject, bare } = await compare(SLICES, () => rateOf(CONNECTIONS, SLICE_MS, ask(path)), () => rateOf(CONNECTIONS, SLICE_MS, ask('/api/bench')));
    return {
      figures: { ratio: rounded(ratio, 3), boards_a_second: rounded(subject, 0), bare_a_second: rounded(bare, 0), wrong },
      bars: [{ name: 'ratio', value: rounded(ratio, 3), min: 0.6 }, { name: 'wrong', value: wrong, max: 0 }],
    };
  } finally {
    client.close();
    await stack.stop();
  }
};
