/** What was asked in the demo world: one question of the class that was answered, and two that wait. */
import { actingAs } from '#server/demo/acting-as.ts';
import { Lesson, type Series, type User } from '#server/models/index.ts';
import { answerQuestion } from '#server/use-cases/questions/answer-question.ts';
import { askQuestion } from '#server/use-cases/questions/ask-question.ts';

export async function askAndAnswer(series: Series, { maud, jonas, wren }: { readonly maud: User; readonly jonas: User; readonly wren: User }): Promise<void> {
  const [first, second] = await Lesson.findAll({ where: { seriesId: series.id }, order: ['position'], limit: 2 });
  if (first === undefined || second === undefined) throw new RangeError('the series has fewer than two parts');
  const asked = { series: series.slug, step: null, photo: null, letter: false, looked: true };
  const { publicId } = await askQuestion(await actingAs(maud), {
    ...asked, lesson: first.publicId, to: 'class',
    words: 'My nails stand 8 mm apart, not 6. Does the wool still fill the rows, or do I need a thicker one?',
  });
  await answerQuestion(await actingAs(wren), {
    question: publicId, seen: 0,
    words: 'It fills them if you take the ends double, as your plan does. Wind ten centimetres as a trial: if you see warp between the rows, beat a little harder before you buy another wool.',
  });
  await askQuestion(await actingAs(jonas), {
    ...asked, lesson: first.publicId, to: 'teacher',
    words: 'I have an old picture frame, 42 cm inside. Is it strong enough, or will the corners give once the warp is on?',
  });
  await askQuestion(await actingAs(maud), {
    ...asked, lesson: second.publicId, to: 'class', step: second.draftReading.ok ? (second.draftReading.steps[0]?.id ?? null) : null,
    words: 'How tight is tight? Mine sounds like a low string when I pluck it.',
  });
}
