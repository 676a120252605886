// One running copy of the portal: cards, mail, worker and server, wired together by their settings.
import { join } from 'node:path';
import { buildEnv } from './build';
import { Processes, script } from './processes';
import { keptSecret } from './secrets';
import { root } from './places';
import { Trouble } from './step';

export type StackSettings = {
  mode: 'demo' | 'test';
  /** Under .tmp: logs, letters, the card stand-in's memory. */
  folder: string;
  build: string;
  database: { DATABASE_URL: string; QUEUE_DATABASE_URL: string };
  ports: { server: number; cards: number; smtp: number; inbox: number };
  /** Settings on top, for tests and benchmarks. */
  more?: Record<string, string>;
  /** Whether letters and payments outlive a restart. */
  remembers: boolean;
};

/** The portal's own settings, as .env.example explains them. */
export function portalEnv({ mode, folder, build, database, ports, more }: StackSettings): Record<string, string> {
  const site = `http://127.0.0.1:${ports.server}`;
  const cards = `http://127.0.0.1:${ports.cards}`;
  return {
    NODE_ENV: 'production', LEAFHALT_MODE: mode, NEXT_DIST_DIR: build, NEXT_TELEMETRY_DISABLED: '1', SITE_URL: site, NEXTAUTH_URL: site,
    DATABASE_URL: database.DATABASE_URL, QUEUE_DATABASE_URL: database.QUEUE_DATABASE_URL,
    NEXTAUTH_SECRET: keptSecret(mode, 'NEXTAUTH_SECRET'), TICKET_KEY_SECRET: keptSecret(mode, 'TICKET_KEY_SECRET'), ...buildEnv(),
    SMTP_URL: `smtp://127.0.0.1:${ports.smtp}`,
    STRIPE_SECRET_KEY: 'sk_test_standIn', STRIPE_WEBHOOK_SECRET: keptSecret(mode, 'STRIPE_WEBHOOK_SECRET', 'base64url', 'whsec_'),
    STRIPE_API_URL: cards, PAY_ORIGIN: cards,
    ...(mode === 'test' && { CLOCK_OFFSET_FILE: join(root, folder, 'clock-offset') }),
    ...more,
  };
}

/** Starts everything and waits until `/api/health` answers. */
export async function startStack(settings: StackSettings, onDeath: (why: Trouble) => void): Promise<Processes> {
  const { folder, ports } = settings;
  const env = portalEnv(settings);
  const site = env['SITE_URL'] ?? '';
  const processes = new Processes(folder, settings.build);
  const died = new Promise<never>((_resolve, reject) => { processes.onDeath = reject; });
  died.catch(() => undefined);
  const clock = env['CLOCK_OFFSET_FILE'];
  processes.start('card stand-in', script('scripts/stand-ins/cards.ts'), {
    CARDS_PORT: String(ports.cards), CARDS_WEBHOOK_URL: `${site}/api/stripe`, STRIPE_WEBHOOK_SECRET: env['STRIPE_WEBHOOK_SECRET'] ?? '',
    ...(settings.remembers && { CARDS_FILE: join(root, folder, 'cards.jsonl') }), ...(clock && { CLOCK_OFFSET_FILE: clock }),
  });
  processes.start('mail stand-in', script('scripts/stand-ins/mail.ts'), {
    MAIL_SMTP_PORT: String(ports.smtp), MAIL_INBOX_PORT: String(ports.inbox), ...(settings.remembers && { MAIL_FOLDER: join(root, folder, 'letters') }),
  });
  processes.start('worker', script('scripts/worker.ts'), env);
  processes.start('server', [process.execPath, 'node_modules/next/dist/bin/next', 'start', '--hostname', '127.0.0.1', '--port', String(ports.server)], env);
  try {
    for (const url of [`http://127.0.0.1:${ports.cards}/_health`, `http://127.0.0.1:${ports.inbox}/letters.json`, `${site}/api/health`]) {
      await Promise.race([died, answers(url, processes)]);
    }
  } catch (error) {
    await processes.stop();
    throw error;
  }
  processes.onDeath = onDeath;
  return processes;
}

async function answers(url: string, processes: Processes): Promise<void> {
  const end = Date.now() + 60_000;
  while (Date.now() < end) {
    const answer = await fetch(url, { signal: AbortSignal.timeout(5000) }).catch(() => null);
    if (answer?.ok) return;
    await new Promise((resolve) => setTimeout(resolve, 150));
  }
  throw new Trouble(`${url} has not answered for a minute.${processes.lastWords('server')}`);
}
