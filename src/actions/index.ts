/** Every form of the site, by feature. */
import { people } from './people.ts';

export const server = { people };
