/** The pattern as it hangs and the piece on the loom that was typed, at one scale. */
import { useMemo } from 'react';
import type { WovenPiece } from '#core/craft/cloth/cloth-piece.ts';
import { clothPieceOf } from '#core/craft/cloth/cloth-piece-of.ts';
import type { FittedPiece } from '#core/craft/fit.ts';
import { countOf, lengthOf } from '#core/craft/amounts/amount-types.ts';
import type { FrameLoomPiece } from '#core/craft/piece.ts';
import type { Trial } from '#core/trial/try-on-loom.ts';
import { formatAmount } from '#core/units/format-amount.ts';
import type { Units } from '#core/units/units.ts';
import { Cloth } from '#islands/cloth/Cloth.tsx';
import { atOneScale } from '#islands/series/at-one-scale.ts';
import type { MadeOnLoom } from '#islands/series/trial.ts';
import { Parts } from '#islands/ui/Parts.tsx';

/** Both drawings without the gap between them; on a phone they shrink by a fifth together. */
const ROOM_PX = 412;

interface TrialLoomsProps {
  readonly name: string;
  readonly teacher: string;
  readonly asPattern: MadeOnLoom;
  readonly trial: Trial;
  readonly units: Units;
  readonly own: boolean;
}

export function TrialLooms({ name, teacher, asPattern, trial, units, own }: TrialLoomsProps) {
  const hers = herLoom(trial);
  const cloths = useMemo(() => ({
    pattern: clothPieceOf(asPattern.piece, asPattern.plan, name),
    hers: hers === null ? null : clothPieceOf(hers.fitted.piece, hers.fitted.plan, name),
  }), [asPattern, hers, name]);
  const inside = cloths.hers?.loom?.insideWidthMm ?? cloths.pattern.loom?.insideWidthMm ?? cloths.pattern.widthMm;
  const { patternPx, loomPx } = atOneScale(cloths.pattern.widthMm, inside, ROOM_PX);
  const views = useMemo(() => ({
    pattern: { id: 'try-pattern', as: 'hanging', width: patternPx, decorative: true },
    hers: { id: 'try-hers', as: 'loom', width: loomPx, woven: hers?.woven ?? 0, fell: false, units },
  } as const), [patternPx, loomPx, hers?.woven, units]);
  return (
    <div className="trial-looms">
      <figure className="cloth">
        <Cloth piece={cloths.pattern} view={views.pattern} />
        <figcaption><b>{teacher}’s</b><br /><Ends made={asPattern} units={units} /></figcaption>
      </figure>
      {cloths.hers !== null && hers !== null && (
        <figure className="cloth">
          <Cloth piece={cloths.hers} view={{ ...views.hers, label: wordsOf(cloths.hers, hers.woven === 1) }} />
          <figcaption><b>{own ? 'Yours' : 'On the loom'}</b><br />{hers.woven === 1 ? <Ends made={hers.fitted} units={units} /> : 'bare warp, as wide as it allows'}<br />drawn at the same scale</figcaption>
        </figure>
      )}
    </div>
  );
}

interface HerLoom { readonly fitted: FittedPiece<FrameLoomPiece>; readonly woven: 0 | 1 }

/** Her loom with the piece on it; bare where the piece does not fit; nothing while it cannot be read. */
function herLoom(trial: Trial): HerLoom | null {
  if (!trial.ok) return null;
  if (trial.fits) return { fitted: trial.fitted, woven: 1 };
  return trial.widest === null ? null : { fitted: trial.widest, woven: 0 };
}

const wordsOf = ({ title }: WovenPiece, woven: boolean): string => (woven ? `${title} on the loom that was typed` : 'The loom that was typed, bare');

function Ends({ made: { piece, plan }, units }: { readonly made: MadeOnLoom; readonly units: Units }) {
  return (
    <>
      <Parts parts={formatAmount(lengthOf(piece.size.widthMm, 'size'), units)} />, <Parts parts={formatAmount(countOf(plan.ends.count, 'end', 'ends'), units)} />{piece.warp.endsTogether === 2 && ' in pairs'}
    </>
  );
}
