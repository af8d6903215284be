/** Every form of the site, by feature. */
import { checkout } from './checkout.ts';
import { office } from './office.ts';
import { people } from './people.ts';

export const server = { checkout, office, people };
