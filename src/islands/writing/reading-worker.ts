/** Reads lesson texts apart from the page, so that typing never waits for it. One text in, its remarks out. */
import { parseLessonText } from '#core/lesson-text/parse-lesson-text.ts';
import { KeptReadings } from '#core/lesson-text/read-in-stretches.ts';

const kept = new KeptReadings();

self.addEventListener('message', ({ data }: MessageEvent<string>) => {
  const reading = parseLessonText(data, kept);
  self.postMessage({ problems: reading.problems, warnings: reading.ok ? reading.warnings : [] });
});
