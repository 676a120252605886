// The demo club, planted by a process of its own: it needs the portal's settings, and we have ours.
import { z } from 'zod';
import { script } from './processes';
import { root } from './places';
import { command } from './step';

const planted = z.object({ plantedOn: z.string(), signIns: z.array(z.object({ name: z.string(), email: z.string(), does: z.string(), password: z.string() })) });

export type Planted = z.output<typeof planted>;

/** Plants the demo club unless it is there; tells from which day its dates count, and who can sign in. */
export async function plant(env: Record<string, string>, ownerUrl: string, signal?: AbortSignal): Promise<Planted> {
  const out = await command('Planting the demo club', script('scripts/stack/seed-once.ts'), {
    cwd: root, env: { ...process.env, ...env, NODE_ENV: 'production', MIGRATE_DATABASE_URL: ownerUrl }, ...(signal && { signal }),
  });
  return planted.parse(JSON.parse(out.trim().split('\n').at(-1) ?? ''));
}
