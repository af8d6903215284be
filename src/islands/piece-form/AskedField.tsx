import { memo } from 'react';
import type { Asked } from '#core/craft/piece-form/asked.ts';
import { fieldText, fieldUnit } from '#core/craft/piece-form/field-text.ts';
import { textOf, type Texts } from '#core/craft/piece-form/typed-piece.ts';
import { Choose } from '#islands/ui/Choose.tsx';
import { Field, Select } from '#islands/ui/Field.tsx';
import { fieldId } from '#islands/ui/field-id.ts';
import { Glyph } from '#islands/ui/Glyph.tsx';
import { useHands, useShown } from './hands.ts';
import { yarnChoices } from './yarn-choices.ts';

interface AskedFieldProps {
  readonly asked: Asked;
  readonly texts: Texts;
  /** Begins the field's name: `bands.2.`. */
  readonly prefix?: string;
  /** A choice as a bar instead of a list. */
  readonly bar?: boolean;
  readonly className?: string;
}

/** One field of the form, as its `Asked` says: label, box, unit, what counts where it stays empty, and what was found. */
export function AskedField({ texts, ...field }: AskedFieldProps) {
  return <OneField {...field} text={textOf(texts, field.asked.key)} />;
}

/** Knows its own text only: a letter in the field beside it does not draw it anew. */
const OneField = memo(function OneField({ asked, text, prefix = '', bar = false, className }: Omit<AskedFieldProps, 'texts'> & { readonly text: string }) {
  const { type } = useHands();
  const { yarns, wrong, heed } = useShown();
  const name = `${prefix}${asked.key}`;
  const words = { name, label: asked.label, hint: asked.hint, error: wrong.get(name) };
  return (
    <div className={className}>
      {bar && asked.kind === 'choice' ? (
        <Choose {...words} legend={asked.label} value={text === '' ? asked.options[0].text : text} options={asked.options.map((option) => ({ value: option.text, label: option.label }))} onChoose={(value) => type(name, value)} />
      ) : asked.kind === 'choice' ? (
        <Select {...words} value={text === '' ? asked.options[0].text : text} options={asked.options.map((option) => ({ value: option.text, label: option.label }))} onChange={(event) => type(name, event.currentTarget.value)} />
      ) : asked.kind === 'role' ? (
        <Select {...words} value={text} options={yarnChoices(yarns, text)} onChange={(event) => type(name, event.currentTarget.value)} />
      ) : (
        <TextOf {...{ asked, name, text, words }} />
      )}
      {heed.has(name) && <p className="heed" id={`${fieldId(name)}-heed`}><Glyph name="info" />{heed.get(name)}</p>}
    </div>
  );
});

interface TextOfProps {
  readonly asked: Asked;
  readonly name: string;
  readonly text: string;
  readonly words: { readonly name: string; readonly label: string; readonly hint: string | undefined; readonly error: string | undefined };
}

/** Characters of two hundred corners with their units. */
const LONGEST_POINTS = 6000;

function TextOf({ asked, name, text, words }: TextOfProps) {
  const { type } = useHands();
  const { units, texts } = useShown();
  const isWords = asked.kind === 'text';
  const standard = asked.standard === undefined ? asked.otherwise : fieldText(asked.standard(texts), asked, units);
  return (
    <Field
      {...words}
      value={text}
      unit={fieldUnit(asked, units)}
      placeholder={standard}
      maxLength={isWords ? asked.maxLength : asked.kind === 'points' ? LONGEST_POINTS : 60}
      inputMode={isWords || asked.kind === 'points' ? undefined : 'decimal'}
      autoComplete="off"
      autoCapitalize={isWords ? undefined : 'off'}
      onChange={(event) => type(name, event.currentTarget.value)}
    />
  );
}

/** Several of them. */
export function AskedFields({ asked, texts, prefix, className }: Omit<AskedFieldProps, 'asked' | 'bar'> & { readonly asked: readonly Asked[] }) {
  return asked.map((one) => <AskedField key={one.key} asked={one} texts={texts} {...(prefix === undefined ? {} : { prefix })} {...(className === undefined ? {} : { className })} />);
}
