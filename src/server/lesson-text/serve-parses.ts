// The inside of a parsing thread: texts come in, results go out. It holds nothing, so it may be stopped at any moment.
import { parentPort } from 'node:worker_threads';
import { parseLessonText, type LessonText, type RefusedText } from '#core/lesson-text/parse-lesson-text.ts';

export type ParseResult = LessonText | RefusedText;

/** What a thread says: that it is ready for texts, or what it made of one. */
export type ThreadMessage = { kind: 'ready' } | { kind: 'parsed'; result: ParseResult };

/** Answers every text sent to this thread, one after another. `parse` differs only in tests. */
export function serveParses(parse: (source: string) => ParseResult = parseLessonText): void {
  const port = parentPort;
  if (port === null) throw new Error('serveParses runs in a worker thread.');
  const say = (message: ThreadMessage): void => {
    port.postMessage(message);
  };
  port.on('message', (source: string) => {
    say({ kind: 'parsed', result: parse(source) });
  });
  say({ kind: 'ready' });
}
