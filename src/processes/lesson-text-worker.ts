/** The parsing thread: started by the processes that read teachers' texts, never by hand. */
import { serveParses } from '#server/lesson-text/serve-parses.ts';

serveParses();
