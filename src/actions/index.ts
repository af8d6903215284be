/** Every form of the site, by feature. */
import { checkout } from './checkout.ts';
import { people } from './people.ts';

export const server = { checkout, people };
