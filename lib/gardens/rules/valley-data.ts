import valleyFile from '@/public/valley/valley.json';
import { type Valley, valleySchema } from './valley';

/** The built-in demo valley, the same file that the browser's map fetches from /valley/valley.json. */
export const builtInValley: Valley = valleySchema.parse(valleyFile);
