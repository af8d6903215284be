import type { Dispatch, ReactNode } from 'react';
import { lengthOf } from '#core/craft/amounts/amount-types.ts';
import { ENDS, INSIDE_HEIGHT, INSIDE_WIDTH, LOOM_KIND, NAIL_PITCH, NAIL_ROWS, WARPING, WIDTH, type AskedLength } from '#core/craft/my-piece/asked-of-mine.ts';
import { chosenLoom } from '#core/craft/my-piece/judge-mine.ts';
import { LOOM_WORDS } from '#core/craft/looms/loom-words.ts';
import { DEFAULT_KIND, loomKind } from '#core/craft/looms/looms.ts';
import { LOOM_NAME, MOST_NAME } from '#core/craft/my-piece/own-loom.ts';
import type { TypedMine } from '#core/craft/my-piece/typed-mine.ts';
import type { FrameLoomPiece } from '#core/craft/piece.ts';
import { fieldUnit } from '#core/craft/piece-form/field-text.ts';
import { textOf } from '#core/craft/piece-form/typed-piece.ts';
import { amountText } from '#core/units/format-amount.ts';
import { Choose } from '#islands/ui/Choose.tsx';
import { Field, Select, UnitField } from '#islands/ui/Field.tsx';
import type { MineEvent } from './mine-after.ts';

interface LoomFieldsProps {
  typed: TypedMine;
  pattern: FrameLoomPiece;
  faults: Readonly<Record<string, string>>;
  /** With script, only what her loom asks is shown. */
  alive: boolean;
  change: Dispatch<MineEvent>;
  /** Looms of hers to choose from. */
  choice: ReactNode;
}

const UNITS = [{ value: 'cm', label: 'cm, g' }, { value: 'in', label: 'in, oz' }] as const;

/** Loom, width and ends. What stays empty is as in the pattern, which stands in the hint. */
export function LoomFields({ typed, pattern, faults, change, alive, choice: ownLooms }: LoomFieldsProps) {
  const { units } = typed;
  const { insideWidthMm, insideHeightMm, nailPitchMm } = pattern.loom;
  const ofPattern: Readonly<Record<string, number | undefined>> = { insideWidthMm, insideHeightMm, nailPitchMm, widthMm: pattern.size.widthMm };
  const lengthField = (asked: AskedLength) => {
    const mm = ofPattern[asked.key];
    const usual = mm === undefined ? '' : `The pattern: ${amountText(lengthOf(mm, asked.kind === 'fine' ? 'fine' : 'size'), units)}.`;
    return (
      <UnitField
        name={asked.key}
        label={asked.label}
        hint={[asked.hint, usual].filter(Boolean).join(' ')}
        unit={fieldUnit(asked, units) ?? ''}
        value={textOf(typed.texts, asked.key)}
        error={faults[asked.key]}
        maxLength={40}
        onChange={(event) => change({ kind: 'type', key: asked.key, text: event.currentTarget.value })}
      />
    );
  };
  const choice = (asked: typeof WARPING) => asked.kind === 'choice' ? asked.options.map(({ text, label }) => ({ value: text, label })) : [];
  const name = chosenLoom(typed).kind ?? pattern.loom.kind ?? DEFAULT_KIND;
  const kind = loomKind({ kind: name });
  const ways = choice(WARPING).filter(({ value }) => kind.warpings.some((way) => way === value));
  const chooser = (asked: typeof WARPING, options: readonly { readonly value: string; readonly label: string }[], hint?: string) => (
    <Choose name={asked.key} legend={asked.label} hint={hint} value={textOf(typed.texts, asked.key)} options={options} error={faults[asked.key]} onChoose={(text) => change({ kind: 'type', key: asked.key, text })} />
  );
  return (
    <fieldset className="stack">
      <legend className="h3">Your loom</legend>
      <Choose name="units" legend="Units" value={units} options={UNITS} onChoose={(other) => change({ kind: 'units', units: other })} />
      <input type="hidden" name="shown" value={units} />
      {ownLooms}
      <Select name={LOOM_KIND.key} label={LOOM_KIND.label} hint={LOOM_WORDS[name].dressing} value={textOf(typed.texts, LOOM_KIND.key)} options={choice(LOOM_KIND)} error={faults[LOOM_KIND.key]} onChange={(event) => change({ kind: 'type', key: LOOM_KIND.key, text: event.currentTarget.value })} />
      {(kind.rows === 2 || !alive) && chooser(NAIL_ROWS, choice(NAIL_ROWS), 'On a loom with two rows of nails.')}
      <div className="two folds">
        {lengthField(INSIDE_WIDTH)}
        {lengthField(INSIDE_HEIGHT)}
        {lengthField(NAIL_PITCH)}
        {lengthField(WIDTH)}
      </div>
      {chooser(ENDS, choice(ENDS), 'Doubled: two ends are worked as one, on a loom whose nails stand close.')}
      {(ways.length > 1 || !alive) && chooser(WARPING, alive ? ways : choice(WARPING))}
      <Field
        name={LOOM_NAME}
        label="Keep this loom on your list as"
        optional
        hint="Then it can be chosen for every series. A name that is on the list already gets these measures."
        value={textOf(typed.texts, LOOM_NAME)}
        error={faults[LOOM_NAME]}
        maxLength={MOST_NAME}
        onChange={(event) => change({ kind: 'type', key: LOOM_NAME, text: event.currentTarget.value })}
      />
    </fieldset>
  );
}

