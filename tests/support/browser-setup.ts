import { filmCode } from './camera';
import { announce, startTestStack } from './stack';

/** Once for all browser tests: one production build, one portal with the demo club, one camera film. */
export default async function setup() {
  await filmCode('NOTHING YET');
  const stack = await startTestStack({ name: 'e2e', seeded: true, serverPort: Number(process.env['LEAFHALT_E2E_PORT']) });
  announce(stack);
  return () => stack.stop();
}
