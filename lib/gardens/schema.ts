import { z } from 'zod';
import { POWERS } from '@/lib/core/words';

/** One value of a query string; a repeated one counts as its first, an unknown one as not asked. */
const first = (value: unknown): unknown => (Array.isArray(value) ? (value[0] as unknown) : value);
const asked = <T extends z.ZodType>(schema: T) => z.preprocess(first, schema.nullable().catch(null));

/**
 * What the gardens page can be narrowed to, as it stands in the address. Whatever cannot be read is not asked,
 * so that an old or mistyped address still shows the gardens.
 */
export const gardenFilters = z.object({
  scale: asked(z.string().regex(/^\d{1,3}(\.\d{1,3})?$/).transform(Number)).default(null),
  runs: asked(z.enum(POWERS)).default(null),
  access: asked(z.enum(['step-free'])).default(null),
  day: asked(z.string().regex(/^[a-z0-9-]{1,80}$/)).default(null),
  places: asked(z.string().regex(/^\d{1,2}$/).transform(Number).refine((heads) => heads >= 1)).default(null),
});
export type GardenFilters = z.output<typeof gardenFilters>;

/** What the address of a plate says: its card, and the version that lets a browser keep it for good. */
export const plateInput = z.object({
  card: z.enum(['primrose', 'lilac', 'rose', 'sage', 'sky', 'buff', 'mint']).catch('sage'),
  v: z.string().max(20).optional(),
});
