// A parsing thread with three kinds of text in it that no limit foresaw: one that never ends, one that eats memory,
// one on which the parser breaks.
import { register } from 'tsx/esm/api';

register();
const { serveParses } = await import('../../../src/server/lesson-text/serve-parses.ts');
const { parseLessonText } = await import('../../../src/core/lesson-text/parse-lesson-text.ts');

serveParses((source) => {
  if (source === 'endless') for (;;);
  if (source === 'broken') throw new TypeError('The parser broke.');
  if (source === 'greedy') {
    const kept = [];
    for (;;) kept.push(Array.from({ length: 100_000 }, () => ({ source })));
  }
  return parseLessonText(source);
});
