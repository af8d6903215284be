/**
 * A student's own cord and rod for a knotted pattern: as text in the fields of a form, so that a slip is shown again as
 * it was typed, and what they come to. What she leaves empty stays as in the pattern.
 */
import { fitPiece, type FittedPiece } from '#core/craft/fit.ts';
import type { MyPiece, OwnCord } from '#core/craft/fitting/my-piece.ts';
import type { MacramePiece } from '#core/craft/macrame/piece.ts';
import type { AskedMeasure } from '#core/craft/piece-form/asked.ts';
import { fieldText, readText } from '#core/craft/piece-form/field-text.ts';
import { textOf, type Texts } from '#core/craft/piece-form/typed-piece.ts';
import { present } from '#core/craft/reading/present.ts';
import type { Problem } from '#core/outcome.ts';
import type { Units } from '#core/units/units.ts';

export interface TypedCords {
  /** Those she chose. */
  readonly units: Units;
  /** Those in which the form stood before her when she typed. */
  readonly shown: Units;
  /** By name of the field. */
  readonly texts: Texts;
}

export interface CordFound {
  /** Name of the field it is about; '' for what belongs to no single one. */
  readonly field: string;
  readonly says: string;
}

export type CordJudgement =
  | { readonly ok: true; readonly mine: MyPiece; readonly fitted: FittedPiece<MacramePiece> }
  | { readonly ok: false; readonly problems: readonly CordFound[] };

const MOST_TYPED = 120;
const THICKNESS: AskedMeasure = { key: 'diameterMm', kind: 'fine', label: 'Thickness' };

export const ROD_FIELD = 'rod.diameterMm';
export const thicknessField = (role: string): string => `cords.${role}.diameterMm`;
export const labelField = (role: string): string => `cords.${role}.label`;
const fieldsOf = ({ yarns }: MacramePiece): string[] => [ROD_FIELD, ...Object.keys(yarns).flatMap((role) => [thicknessField(role), labelField(role)])];

/** What she keeps, as the form shows it. */
export function typeCords({ cords = {}, rod }: MyPiece, pattern: MacramePiece, units: Units): TypedCords {
  const ofRole = (role: string): OwnCord | undefined => (Object.hasOwn(cords, role) ? cords[role] : undefined);
  const texts = Object.keys(pattern.yarns).flatMap((role): [string, string][] => [[thicknessField(role), fieldText(ofRole(role)?.diameterMm, THICKNESS, units)], [labelField(role), ofRole(role)?.label ?? '']]);
  return { units, shown: units, texts: { ...Object.fromEntries(texts), [ROD_FIELD]: fieldText(rod?.diameterMm, THICKNESS, units) } };
}

/** The form as it was sent; what is missing is empty. `ask` gives the text under a name. */
export function cordsOfFields(ask: (name: string) => string | undefined, pattern: MacramePiece): TypedCords {
  const unitsIn = (name: string): Units => (ask(name) === 'in' ? 'in' : 'cm');
  return { units: unitsIn('units'), shown: unitsIn('shown'), texts: Object.fromEntries(fieldsOf(pattern).map((name) => [name, (ask(name) ?? '').slice(0, MOST_TYPED)])) };
}

function readThickness({ texts, shown }: TypedCords, field: string, faults: CordFound[]): number | undefined {
  const text = textOf(texts, field);
  if (text.trim() === '') return undefined;
  const read = readText(text, THICKNESS, shown);
  if (read.ok) return read.value;
  faults.push({ field, says: read.says });
  return undefined;
}

function placed({ path, message }: Problem): CordFound {
  const [, first, role] = path.split('/');
  return { field: first === 'rod' ? ROD_FIELD : first === 'yarns' && role !== undefined ? thicknessField(role) : '', says: message };
}

/** Her own piece with its plan, or a sentence at every field that stands in the way. */
export function judgeCords(typed: TypedCords, pattern: MacramePiece): CordJudgement {
  const faults: CordFound[] = [];
  const cords = Object.keys(pattern.yarns).flatMap((role): [string, OwnCord][] => {
    const diameterMm = readThickness(typed, thicknessField(role), faults);
    const label = textOf(typed.texts, labelField(role)).trim();
    return diameterMm === undefined ? [] : [[role, { diameterMm, ...present({ label: label === '' ? undefined : label }) }]];
  });
  const rodMm = readThickness(typed, ROD_FIELD, faults);
  const mine: MyPiece = present({ cords: cords.length === 0 ? undefined : Object.fromEntries(cords), rod: rodMm === undefined ? undefined : { diameterMm: rodMm } });
  const fitted = fitPiece(pattern, mine, typed.units);
  if (faults.length > 0 || !fitted.ok) return { ok: false, problems: faults.length > 0 || fitted.ok ? faults : fitted.problems.map(placed) };
  return { ok: true, mine, fitted: fitted.value };
}
