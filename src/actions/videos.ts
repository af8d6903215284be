/** Forms about a video: its captions, chapters, poster, and its place in a part's text. */
import { defineAction } from 'astro:actions';
import { CaptionsForm, ChaptersForm, DeleteVideoForm, PosterForm, PutVideoInForm } from '#contracts/video.ts';
import { readChapters } from '#core/captions/read-chapters.ts';
import { readVtt } from '#core/captions/read-vtt.ts';
import { withoutVideo } from '#core/lesson-text/without-video.ts';
import { clockWords } from '#core/moment-words.ts';
import type { Context } from '#server/context.ts';
import { fieldError, found, signedIn } from '#server/errors.ts';
import { draftOf } from '#server/queries/workroom/draft-of.ts';
import { deleteVideo } from '#server/use-cases/videos/delete-video.ts';
import { saveVideoDraft, type VideoDraftSaved } from '#server/use-cases/videos/save-video-draft.ts';
import { saveLessonDraft } from '#server/use-cases/workroom/save-lesson-draft.ts';
import { answerForm, type FormAnswer } from '#server/web/form.ts';
import { formAction, type Done } from './form-action.ts';

const done = (ctx: Context, { series, name, savedAt }: VideoDraftSaved, anchor: string): Done =>
  ({ to: `/workroom/series/${series}/videos/${name}#${anchor}`, said: `Saved ${clockWords(savedAt, signedIn(ctx).timeZone)}` });

export const videos = {
  /** A file, when one was chosen, stands in the place of the typed text. */
  saveCaptions: defineAction({
    accept: 'form',
    handler: async (form: FormData, { locals: { ctx } }): Promise<FormAnswer> => {
      const chosen = form.get('file');
      const file = chosen instanceof File && chosen.name !== '' ? await chosen.text() : null;
      if (file !== null) form.set('vtt', file);
      return answerForm(CaptionsForm, form, async ({ video, revision, vtt }) => {
        const reading = readVtt(vtt, null);
        if (!reading.ok) throw fieldError(file === null ? 'vtt' : 'file', reading.problems.map(({ line, says }) => `Line ${line}: ${says}`).join(' '));
        return done(ctx, await saveVideoDraft(ctx, { video, revision, change: { cues: reading.cues } }), 'captions');
      });
    },
  }),
  saveChapters: formAction(ChaptersForm, async ({ video, revision, chapters }, ctx) => {
    const reading = readChapters(chapters, null);
    if (!reading.ok) throw fieldError('chapters', reading.says);
    return done(ctx, await saveVideoDraft(ctx, { video, revision, change: { chapters: reading.chapters } }), 'chapters');
  }),
  choosePoster: formAction(PosterForm, async ({ video, revision, poster }, ctx) => done(ctx, await saveVideoDraft(ctx, { video, revision, change: { poster } }), 'poster')),
  /** At the head of the part's text, where a lesson begins with it. */
  putIn: formAction(PutVideoInForm, async ({ lesson, name }, ctx) => {
    const { revision, source } = found(await draftOf(signedIn(ctx), lesson));
    const tag = `<Video name="${name}"/>`;
    const { part } = await saveLessonDraft(ctx, { lesson, revision, source: source.includes(tag) ? source : `${tag}\n\n${source}` });
    return { to: `/workroom/series/${part.series}/parts/${part.publicId}`, said: 'The video stands at the head of the text.' };
  }),
  /** Out of a part's draft; students see it until the part is published. */
  takeOut: formAction(PutVideoInForm, async ({ lesson, name }, ctx) => {
    const { revision, source } = found(await draftOf(signedIn(ctx), lesson));
    const { part } = await saveLessonDraft(ctx, { lesson, revision, source: withoutVideo(source, name) });
    return { to: `/workroom/series/${part.series}/videos/${name}#delete`, said: `It is out of the text of Part ${part.number}.` };
  }),
  deleteVideo: formAction(DeleteVideoForm, async (input, ctx) => {
    const { title } = await deleteVideo(ctx, input);
    return { to: `/workroom/series/${input.series}`, said: `“${title}” is deleted.` };
  }),
};
