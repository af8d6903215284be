/** Every form of the site, by feature. */
import { bench } from './bench.ts';
import { checkout } from './checkout.ts';
import { finish } from './finish.ts';
import { following } from './following.ts';
import { helpers } from './helpers.ts';
import { looms } from './looms.ts';
import { notices } from './notices.ts';
import { office } from './office.ts';
import { people } from './people.ts';
import { pieces } from './pieces.ts';
import { questions } from './questions.ts';
import { reviews } from './reviews.ts';
import { videos } from './videos.ts';
import { workroom } from './workroom.ts';

export const server = { bench, checkout, finish, following, helpers, looms, notices, office, people, pieces, questions, reviews, videos, workroom };
