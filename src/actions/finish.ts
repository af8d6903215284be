import { FinishedForm, HangForm, HidePieceForm, SaySoForm, ShowPieceForm } from '#contracts/finish.ts';
import { hangPiece } from '#server/use-cases/finish/hang-piece.ts';
import { hidePiece, showPiece } from '#server/use-cases/finish/hide-piece.ts';
import { saySo } from '#server/use-cases/finish/say-so.ts';
import { takeOffWall } from '#server/use-cases/finish/take-off-wall.ts';
import { takePhotoOut } from '#server/use-cases/finish/take-photo-out.ts';
import { writeDown } from '#server/use-cases/finish/write-down.ts';
import { formAction } from './form-action.ts';

/** Forms of a piece that is off the loom. */
export const finish = {
  saySo: formAction(SaySoForm, async (input, ctx) => {
    await saySo(ctx, input);
    return { to: `/series/${input.series}/finish`, said: 'Your piece is off the loom. Write down what you want to remember.' };
  }),
  writeDown: formAction(FinishedForm, async (input, ctx) => {
    await writeDown(ctx, input);
    return { to: `/series/${input.series}/finish#record`, said: 'It is written down. The label goes by it.' };
  }),
  takePhotoOut: formAction(SaySoForm, async (input, ctx) => {
    await takePhotoOut(ctx, input);
    return { to: `/series/${input.series}/finish#photo`, said: 'The photo is taken out for good.' };
  }),
  hang: formAction(HangForm, async (input, ctx) => {
    await hangPiece(ctx, input);
    return { to: `/series/${input.series}/finish#wall`, said: 'Your piece hangs on the wall.' };
  }),
  takeOffWall: formAction(SaySoForm, async (input, ctx) => {
    await takeOffWall(ctx, input);
    return { to: `/series/${input.series}/finish#wall`, said: 'Your piece is off the wall. Nobody else sees it any more.' };
  }),
  hide: formAction(HidePieceForm, async (input, ctx) => {
    await hidePiece(ctx, input);
    return { to: '/wall', said: 'The piece is taken down. Its maker reads why.' };
  }),
  show: formAction(ShowPieceForm, async (input, ctx) => {
    await showPiece(ctx, input);
    return { to: '/wall', said: 'The piece hangs again.' };
  }),
};
