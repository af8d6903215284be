import { CalendarForm, FinishForm, GatheredForm, ReadForm, StashForm } from '#contracts/following.ts';
import { MyPieceForm } from '#contracts/my-piece.ts';
import { RowsForm } from '#contracts/rows.ts';
import { TickInput } from '#contracts/ticks.ts';
import { ChangeTimeForm, WriteTimeForm } from '#contracts/weaving-time.ts';
import { stepAnchor } from '#core/lesson-text/tree.ts';
import { saveMyPiece } from '#server/use-cases/pieces/save-my-piece.ts';
import { sayRows } from '#server/use-cases/progress/count-rows.ts';
import { finishPart } from '#server/use-cases/progress/finish-part.ts';
import { keepGathered } from '#server/use-cases/progress/keep-gathered.ts';
import { keepStash } from '#server/use-cases/progress/keep-stash.ts';
import { readAnew } from '#server/use-cases/progress/note-reading.ts';
import { setTick } from '#server/use-cases/progress/set-tick.ts';
import { changeTime, writeDownTime } from '#server/use-cases/progress/write-down-time.ts';
import { renewCalendar } from '#server/use-cases/timetable/renew-calendar.ts';
import { formAction } from './form-action.ts';

/** Forms of following a series. A form goes back to the page it stands on, at its place. */
export const following = {
  tick: formAction(TickInput, async (input, ctx, api) => {
    await setTick(ctx, input);
    return { to: `${api.url.pathname}${input.subject === 'step' ? `#${stepAnchor(input.item)}` : ''}` };
  }),

  gathered: formAction(GatheredForm, async (input, ctx, api) => {
    const count = await keepGathered(ctx, input);
    return { to: `${api.url.pathname}#gather`, said: count === 0 ? 'Nothing had changed.' : 'Your ticks are kept.' };
  }),

  rows: formAction(RowsForm, async (input, ctx) => {
    await sayRows(ctx, input);
    return { to: `/series/${input.series}/${input.part}/loomside?step=${input.step}#rows` };
  }),

  writeTime: formAction(WriteTimeForm, async (input, ctx) => {
    await writeDownTime(ctx, input);
    return { to: '/loom#time', said: 'Your time is written down.' };
  }),

  changeTime: formAction(ChangeTimeForm, async (input, ctx) => {
    const { isTakenOut } = await changeTime(ctx, input);
    return { to: '/loom#time', said: isTakenOut ? 'That time is taken out.' : 'That time is changed.' };
  }),

  stash: formAction(StashForm, async (input, ctx, api) => {
    await keepStash(ctx, input);
    return { to: `${api.url.pathname}#to-buy`, said: 'What you have is kept, and taken off what is to buy.' };
  }),

  finish: formAction(FinishForm, async (input, ctx) => {
    const { number, next, isLast } = await finishPart(ctx, input);
    if (!input.done) return { to: `/series/${input.series}/${number}#end`, said: `Part ${number} is open again.` };
    return next === null ? { to: '/loom', said: `Part ${number} is done. ${isLast ? 'The piece is off the loom.' : 'You get a letter when the next part opens.'}` } : { to: `/series/${input.series}/${next}`, said: `Part ${number} is done.` };
  }),

  readAnew: formAction(ReadForm, async (input, ctx) => {
    const { number } = await readAnew(ctx, input);
    return { to: `/series/${input.series}/${number}` };
  }),

  renewCalendar: formAction(CalendarForm, async ({ series }, ctx) => {
    await renewCalendar(ctx, series);
    return { to: `/series/${series}/timetable#subscribe`, said: 'A new address is made. The old one has ended.' };
  }),

  savePiece: formAction(MyPieceForm, async (input, ctx) => {
    const { isBegun } = await saveMyPiece(ctx, input);
    const said = input.asPattern === undefined ? 'Your piece is kept.' : 'Your piece is as the pattern again.';
    return { to: `/series/${input.series}/piece`, said: `${said} ${isBegun ? 'What is woven stays as it is; the rest is reckoned anew.' : 'Every amount is reckoned for it.'}` };
  }),
};
