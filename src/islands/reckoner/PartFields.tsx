/** The fields of one part. There are many on the page, and a letter changes one: a part is drawn anew only when one of its own changed. */
import { memo, type ReactNode } from 'react';
import { ClothFields } from '#islands/reckoner/ClothFields.tsx';
import type { FormHand } from '#islands/reckoner/form-hand.ts';
import type { PartName, PartWords } from '#islands/reckoner/parts.ts';
import { PieceFields } from '#islands/reckoner/PieceFields.tsx';
import { SettFields } from '#islands/reckoner/SettFields.tsx';
import { ShapeFields } from '#islands/reckoner/ShapeFields.tsx';
import { RodFields, RyaFields, SoumakFields } from '#islands/reckoner/StitchFields.tsx';
import { YarnFields } from '#islands/reckoner/YarnFields.tsx';

const FIELDS: Readonly<Record<PartName, (props: { hand: FormHand }) => ReactNode>> = {
  yarn: YarnFields, sett: SettFields, cloth: ClothFields, soumak: SoumakFields, rya: RyaFields, shape: ShapeFields, rod: RodFields, piece: PieceFields,
};

interface PartFieldsProps {
  readonly part: PartWords;
  readonly hand: FormHand;
}

const isAsItWas = ({ part, hand: before }: PartFieldsProps, { hand: now }: PartFieldsProps): boolean =>
  before.form.units === now.form.units && [...part.fields, ...(part.besides ?? [])].every((field) => before.form[field] === now.form[field] && before.errors[field] === now.errors[field]);

export const PartFields = memo(function PartFields({ part, hand }: PartFieldsProps) {
  const Fields = FIELDS[part.name];
  return <Fields hand={hand} />;
}, isAsItWas);
