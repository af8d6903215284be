/** Forms of the teacher's workroom: series, parts and their order, texts, settings, gathering lists, publishing. */
import {
  GatheringForm, GatheringItemForm, KeptThingForm, KeptThingItemForm, LessonDraftForm, LessonForm, LessonSettingsForm, MoveGatheringForm, MoveLessonForm,
  NewGatheringForm, NewKeptThingForm, NewLessonForm, NewSeriesForm, RestoreTextForm, SeriesDetailsForm, SeriesForm, WorkroomForm,
} from '#contracts/workroom.ts';
import { partsList } from '#core/series/parts-list.ts';
import { clockWords } from '#core/moment-words.ts';
import type { Context } from '#server/context.ts';
import { signedIn } from '#server/errors.ts';
import { publishPart } from '#server/use-cases/series/publish-part.ts';
import { publishSeries } from '#server/use-cases/series/publish-series.ts';
import { takeBackSeries } from '#server/use-cases/series/take-back-series.ts';
import { addGatheringItem, moveGatheringItem, putBackGatheringItem, saveGatheringItem, takeOutGatheringItem, type LinePlace } from '#server/use-cases/workroom/change-gathering.ts';
import type { PartPlace } from '#server/use-cases/workroom/_part-place.ts';
import { addLesson, moveLesson, putBackLesson, takeOutLesson } from '#server/use-cases/workroom/change-lessons.ts';
import { createSeries } from '#server/use-cases/workroom/create-series.ts';
import { addKeptThing, putBackKeptThing, saveKeptThing, takeOutKeptThing } from '#server/use-cases/workroom/keep-things.ts';
import { restoreLessonText } from '#server/use-cases/workroom/restore-lesson-text.ts';
import { saveLessonDraft } from '#server/use-cases/workroom/save-lesson-draft.ts';
import { saveLessonSettings } from '#server/use-cases/workroom/save-lesson-settings.ts';
import { saveSeriesDetails } from '#server/use-cases/workroom/save-series-details.ts';
import { saveWorkroom } from '#server/use-cases/workroom/save-workroom.ts';
import { formAction } from './form-action.ts';

const seriesAt = (slug: string, anchor = ''): string => `/workroom/series/${slug}${anchor}`;
const partAt = ({ series, publicId }: PartPlace, page = ''): string => `${seriesAt(series)}/parts/${publicId}${page}`;
const listAt = ({ part, publicId }: LinePlace, at = 'line'): string => `${partAt(part, '/gather')}#${at}-${publicId}`;
const THINGS = '/workroom/things';
const thingAt = ({ publicId }: { publicId: string }): string => `${THINGS}#thing-${publicId}`;
const savedNow = (ctx: Context): string => `Saved ${clockWords(ctx.clock.now(), signedIn(ctx).timeZone)}`;

export const workroom = {
  saveWorkroom: formAction(WorkroomForm, async (input, ctx) => {
    await saveWorkroom(ctx, input);
    return { to: '/workroom/settings', said: savedNow(ctx) };
  }),
  createSeries: formAction(NewSeriesForm, async (input, ctx) => {
    const { slug } = await createSeries(ctx, input);
    return { to: seriesAt(slug), said: 'The series is made. Nobody but you sees it yet.' };
  }),
  saveDetails: formAction(SeriesDetailsForm, async (input, ctx) => {
    await saveSeriesDetails(ctx, input);
    return { to: seriesAt(input.series, '#words'), said: savedNow(ctx) };
  }),
  publish: formAction(SeriesForm, async ({ series }, ctx) => {
    const { out, held } = await publishSeries(ctx, series);
    return { to: seriesAt(series), said: held.length === 0 ? 'Published. Students read it from now on.' : `Published: ${partsList(out)}. ${partsList(held)} ${held.length === 1 ? 'waits until it is' : 'wait until they are'} ready.` };
  }),
  publishPart: formAction(LessonForm, async ({ lesson }, ctx) => {
    const part = await publishPart(ctx, lesson);
    return { to: seriesAt(part.series, `#part-${part.publicId}`), said: `Part ${part.number} is published. Who has a seat gets a letter when it opens to her, once.` };
  }),
  takeBack: formAction(SeriesForm, async ({ series }, ctx) => {
    await takeBackSeries(ctx, series);
    return { to: seriesAt(series), said: 'Taken back to draft. Who has a seat keeps it.' };
  }),

  addPart: formAction(NewLessonForm, async (input, ctx) => {
    const part = await addLesson(ctx, input);
    return { to: seriesAt(part.series, `#part-${part.publicId}`), said: `Part ${part.number} put in.` };
  }),
  movePart: formAction(MoveLessonForm, async (input, ctx) => {
    const part = await moveLesson(ctx, input);
    const undo = part.from === part.number ? '' : `?moved=${part.publicId}&from=${part.from}`;
    return { to: `${seriesAt(part.series)}${undo}#${input.by ?? 'part'}-${part.publicId}`, said: `“${part.title}” is now Part ${part.number}.` };
  }),
  takeOutPart: formAction(LessonForm, async ({ lesson }, ctx) => {
    const part = await takeOutLesson(ctx, lesson);
    return { to: `${seriesAt(part.series)}?out=${part.publicId}#parts` };
  }),
  putBackPart: formAction(LessonForm, async ({ lesson }, ctx) => {
    const part = await putBackLesson(ctx, lesson);
    return { to: seriesAt(part.series, `#part-${part.publicId}`), said: `“${part.title}” is back as Part ${part.number}.` };
  }),

  saveDraft: formAction(LessonDraftForm, async (input, ctx) => {
    const { part } = await saveLessonDraft(ctx, input);
    return { to: partAt(part), said: savedNow(ctx) };
  }),
  restoreText: formAction(RestoreTextForm, async (input, ctx) => {
    const part = await restoreLessonText(ctx, input);
    return { to: partAt(part), said: 'Taken up again. The text that stood here is kept among the versions.' };
  }),
  saveSettings: formAction(LessonSettingsForm, async (input, ctx) => {
    const part = await saveLessonSettings(ctx, input);
    return { to: partAt(part, '/settings'), said: savedNow(ctx) };
  }),

  addLine: formAction(NewGatheringForm, async (input, ctx) => {
    const line = await addGatheringItem(ctx, input);
    return { to: listAt(line), said: `${line.name} put on the list.` };
  }),
  saveLine: formAction(GatheringForm, async (input, ctx) => {
    const line = await saveGatheringItem(ctx, input);
    return { to: listAt(line), said: savedNow(ctx) };
  }),
  moveLine: formAction(MoveGatheringForm, async ({ item, by }, ctx) => {
    const line = await moveGatheringItem(ctx, item, by);
    return { to: listAt(line, by), said: `${line.name} is now line ${line.number}.` };
  }),
  takeOutLine: formAction(GatheringItemForm, async ({ item }, ctx) => {
    const line = await takeOutGatheringItem(ctx, item);
    return { to: `${partAt(line.part, '/gather')}?out=${line.publicId}#list-title` };
  }),
  putBackLine: formAction(GatheringItemForm, async ({ item }, ctx) => {
    const line = await putBackGatheringItem(ctx, item);
    return { to: listAt(line), said: `${line.name} is back on the list.` };
  }),

  keepThing: formAction(NewKeptThingForm, async (input, ctx) => {
    const thing = await addKeptThing(ctx, input);
    return { to: thingAt(thing), said: `${thing.name} is kept for your lists.` };
  }),
  saveThing: formAction(KeptThingForm, async (input, ctx) => ({ to: thingAt(await saveKeptThing(ctx, input)), said: savedNow(ctx) })),
  takeOutThing: formAction(KeptThingItemForm, async ({ thing: publicId }, ctx) => {
    const { name } = await takeOutKeptThing(ctx, publicId);
    return { to: THINGS, said: `${name} taken out. Lists keep their lines of it, and it can be put back below.` };
  }),
  putBackThing: formAction(KeptThingItemForm, async ({ thing: publicId }, ctx) => {
    const thing = await putBackKeptThing(ctx, publicId);
    return { to: thingAt(thing), said: `${thing.name} is back among your things.` };
  }),
};
