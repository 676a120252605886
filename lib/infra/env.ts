import { z } from 'zod';

const url = z.url({ error: 'must be a URL' });
const secret = z.string({ error: 'is missing' }).min(32, { error: 'must be at least 32 characters' });

const schema = z.object({
  LEAFHALT_MODE: z.enum(['demo', 'live', 'test', 'development'], { error: 'must be demo, live, test or development' }).default('development'),
  SITE_URL: url.default('http://127.0.0.1:3000'),
  DATABASE_URL: z.string({ error: 'is missing' }).startsWith('postgres', { error: 'must begin with postgres://' }),
  QUEUE_DATABASE_URL: z.string().startsWith('postgres', { error: 'must begin with postgres://' }).optional(),
  NEXTAUTH_SECRET: secret,
  TICKET_KEY_SECRET: secret,
  SMTP_URL: z.string({ error: 'is missing' }).regex(/^smtps?:\/\//, { error: 'must begin with smtp:// or smtps://' }),
  STRIPE_SECRET_KEY: z.string({ error: 'is missing' }).min(8, { error: 'is too short' }),
  STRIPE_WEBHOOK_SECRET: z.string({ error: 'is missing' }).min(8, { error: 'is too short' }),
  STRIPE_API_URL: url.optional(),
  TRUSTED_PROXY_HOPS: z.coerce.number().int().min(0).max(5).default(0),
  CLOCK_OFFSET_FILE: z.string().optional(),
});

export type Env = z.output<typeof schema>;

let parsed: Env | undefined;

/** The environment, parsed once. A wrong or missing variable stops the start with one clear line. */
export function env(): Env {
  if (parsed) return parsed;
  const result = schema.safeParse(process.env);
  if (!result.success) {
    const wrong = result.error.issues.map((issue) => `${issue.path.join('.')} ${issue.message}`).join('; ');
    throw new Error(`The environment is not right: ${wrong}. See .env.example.`);
  }
  parsed = result.data;
  return parsed;
}

/** Forgets the parsed environment. For tests that set variables of their own. */
export function forgetEnv(): void {
  parsed = undefined;
}
