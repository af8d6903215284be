import type { Dispatch } from 'react';
import { bandWords } from '#core/craft/fitting/tell-changes.ts';
import { BANDS_DONE, HEIGHT, leftAsked, ROWS } from '#core/craft/my-piece/asked-of-woven.ts';
import type { TypedMine } from '#core/craft/my-piece/typed-mine.ts';
import { wovenAsked } from '#core/craft/my-piece/typed-woven.ts';
import type { Asked } from '#core/craft/piece-form/asked.ts';
import { fieldUnit } from '#core/craft/piece-form/field-text.ts';
import { textOf } from '#core/craft/piece-form/typed-piece.ts';
import type { FrameLoomPiece } from '#core/craft/piece.ts';
import type { FrameLoomPlan } from '#core/craft/plan-types.ts';
import { rowsIn } from '#core/craft/rest/woven-share.ts';
import { Field, Select, UnitField } from '#islands/ui/Field.tsx';
import { Fold } from '#islands/ui/Fold.tsx';
import type { MineEvent } from './mine-after.ts';

interface WovenFieldsProps {
  typed: TypedMine;
  /** Her piece as the form has it, or the pattern while that does not work out. */
  piece: FrameLoomPiece;
  plan: FrameLoomPlan | null;
  faults: Readonly<Record<string, string>>;
  change: Dispatch<MineEvent>;
}

/** How far a piece on the loom is, and what yarn is left for the rest of it. */
export function WovenFields({ typed, piece, plan, faults, change }: WovenFieldsProps) {
  const fields = wovenAsked(typed);
  const isNeeded = fields.some(({ key }) => faults[key] !== undefined || !['', '0'].includes(textOf(typed.texts, key)));
  const measure = (asked: Asked) => ({
    name: asked.key,
    value: textOf(typed.texts, asked.key),
    error: faults[asked.key],
    maxLength: 40,
    onChange: (event: { currentTarget: { value: string } }) => change({ kind: 'type', key: asked.key, text: event.currentTarget.value }),
  });
  return (
    <Fold className="fold woven-fields" needed={isNeeded} summaryClass="h3" summary="I have already woven some of it">
      <p className="small quiet">Say how far you are, and the rest is reckoned from there: rows, time, and whether your yarn suffices. The cloth you measured counts for more than the plan.</p>
      <div className="two folds">
        <Select {...measure(BANDS_DONE)} label={BANDS_DONE.label} options={placesIn(piece)} className="whole" />
        <Field {...measure(ROWS)} label={ROWS.label} hint={rowsHint(typed, piece, plan)} inputMode="numeric" optional />
        <UnitField {...measure(HEIGHT)} label={HEIGHT.label} hint={HEIGHT.hint} unit={fieldUnit(HEIGHT, typed.units) ?? ''} optional />
      </div>
      <fieldset>
        <legend className="label">Yarn that is left</legend>
        <span className="hint">Weigh what you still have of each, to see whether it suffices. What stays empty is not judged.</span>
        <div className="two folds">
          {Object.entries(piece.yarns).map(([role, { label }]) => {
            const asked = leftAsked(role);
            return <UnitField key={role} {...measure(asked)} label={label === undefined ? role : `${label} (${role})`} unit={fieldUnit(asked, typed.units) ?? ''} />;
          })}
        </div>
      </fieldset>
    </Fold>
  );
}

/** From the band woven first on. */
function placesIn({ bands }: FrameLoomPiece): { readonly value: string; readonly label: string }[] {
  const all = bands.length;
  const done = bands.map((band, index) => ({ value: String(index + 1), label: index + 1 === all ? `All ${String(all)}` : `${String(index + 1)} of ${String(all)}, up to ${bandWords(band, index)}` }));
  return [{ value: '0', label: 'None yet' }, ...done];
}

function rowsHint(typed: TypedMine, piece: FrameLoomPiece, plan: FrameLoomPlan | null): string {
  const index = Number(textOf(typed.texts, BANDS_DONE.key));
  const band = piece.bands[index];
  if (plan === null || band === undefined) return ROWS.hint ?? '';
  const rows = rowsIn(plan.bands[index], band);
  const words = bandWords(band, index);
  return rows === undefined ? `Now comes ${words}, which has no rows to count.` : `Now comes ${words}, with ${String(rows)} rows by the plan.`;
}
