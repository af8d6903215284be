/** What a student's form comes to: her own piece with its plan, or a sentence at every field that stands in the way. */
import type { FittedPiece, MyPiece } from '#core/craft/fit.ts';
import { fitWoven } from '#core/craft/frame-loom/fit-woven.ts';
import { waysToFit, type WayToFit } from '#core/craft/fitting/ways-to-fit.ts';
import { DEFAULT_KIND, LOOM_KIND_NAMES, loomKind, NAIL_ROW_NAMES } from '#core/craft/looms/looms.ts';
import type { EndsTogether, LoomKindName, NailRows, FrameLoomPiece, Warping } from '#core/craft/piece.ts';
import { WRAPS } from '#core/craft/piece-form/asked-of-yarn.ts';
import { readTyped } from '#core/craft/piece-form/read-typed.ts';
import { textOf } from '#core/craft/piece-form/typed-piece.ts';
import { present } from '#core/craft/reading/present.ts';
import type { Outcome, Problem } from '#core/outcome.ts';
import { ENDS, INSIDE_HEIGHT, INSIDE_WIDTH, LOOM_KIND, NAIL_PITCH, NAIL_ROWS, WARP_YARN, WARPING, WAY_KEY, WIDTH, YARN_KEYS, type AskedLength } from './asked-of-mine.ts';
import { isTold, judgeWoven, NOTHING_KEPT, wovenFieldOf, type Halfway, type KeptPiece } from './judge-woven.ts';
import { isOwnYarn, leftOutBy, wayOf, yarnOf, type TypedMine } from './typed-mine.ts';
import { readLength } from './read-length.ts';
import { readTypedWoven } from './typed-woven.ts';

export interface MineFound {
  /** Name of the field it is about; '' for what belongs to no single one. */
  readonly field: string;
  readonly says: string;
  /** Of what the engine found. */
  readonly code?: string;
}

export type MineJudgement =
  /** `halfway` is null while nothing is said of what is woven. */
  | { readonly ok: true; readonly mine: MyPiece; readonly fitted: FittedPiece<FrameLoomPiece>; readonly warnings: readonly MineFound[]; readonly halfway: Halfway | null }
  /** `fitted` is there where only the rest of it stands in the way, or a field that cannot be read. */
  | { readonly ok: false; readonly problems: readonly MineFound[]; readonly fitted?: FittedPiece<FrameLoomPiece> };

/** `kept` is her piece before: begun, it stays on the loom as it is. */
export function judgeMine(typed: TypedMine, pattern: FrameLoomPiece, kept: KeptPiece = NOTHING_KEPT): MineJudgement {
  const faults = new Map<string, string>();
  const { mine, outcome: fitted } = inHerWay(typed, pattern, readMine(typed, pattern, faults));
  const woven = readTypedWoven(typed, faults);
  const halfway = !fitted.ok ? fitted : isTold(woven) ? judgeWoven(woven, mine, fitted.value, kept, pattern, typed.units) : null;
  if (fitted.ok && halfway?.ok !== false && faults.size === 0) {
    return { ok: true, mine, fitted: fitted.value, warnings: placed(fitted.warnings, pattern), halfway: halfway?.value ?? null };
  }
  const own = [...faults].map(([field, says]): MineFound => ({ field, says }));
  const engine = halfway?.ok === false ? placed(halfway.problems, pattern).filter(({ field }) => !isSaid(faults, field)) : [];
  return { ok: false, problems: [...own, ...onePerField(engine)], ...(fitted.ok ? { fitted: fitted.value } : {}) };
}

/** What she typed of her piece without the way of fitting it, and every way there is. */
export function waysOf(typed: TypedMine, pattern: FrameLoomPiece): { readonly mine: MyPiece; readonly ways: readonly WayToFit[] } {
  const mine = readMine(typed, pattern, new Map());
  return { mine, ways: waysToFit(pattern, mine, typed.units, leftOutBy(typed, pattern)) };
}

/** A way that her loom does not call for any more falls away. */
function inHerWay(typed: TypedMine, pattern: FrameLoomPiece, mine: MyPiece): { readonly mine: MyPiece; readonly outcome: Outcome<FittedPiece<FrameLoomPiece>> } {
  const id = wayOf(typed);
  const chosen = id === 'as-it-is' ? undefined : waysToFit(pattern, mine, typed.units, leftOutBy(typed, pattern)).find((way) => way.id === id);
  if (chosen === undefined) return { mine, outcome: fitWoven(pattern, mine, typed.units) };
  return { mine: present({ ...mine, way: chosen.way }), outcome: chosen.outcome };
}

/** A yarn whose wraps cannot be read has no thickness: what the engine says of that gap is nothing new. */
function isSaid(faults: ReadonlyMap<string, string>, field: string): boolean {
  return faults.has(field) || (field.endsWith('.grist') && faults.has(field.replace(/grist$/, WRAPS.key)));
}

function onePerField(found: readonly MineFound[]): MineFound[] {
  return [...new Map(found.toReversed().map((one) => [one.field, one])).values()].toReversed();
}

/** What differs from the pattern; a choice that is the pattern's own is none. */
function readMine(typed: TypedMine, pattern: FrameLoomPiece, faults: Map<string, string>): MyPiece {
  const length = (asked: AskedLength): number | undefined => readLength(typed, asked, faults);
  const { kind, nailRows, warping } = chosenLoom(typed);
  const together = endsOf(textOf(typed.texts, ENDS.key));
  const loom = present({
    insideWidthMm: length(INSIDE_WIDTH),
    insideHeightMm: length(INSIDE_HEIGHT),
    nailPitchMm: length(NAIL_PITCH),
    kind: kind === (pattern.loom.kind ?? DEFAULT_KIND) ? undefined : kind,
    nailRows: nailRows === (pattern.loom.nailRows ?? 'both') ? undefined : nailRows,
    warping: warping === pattern.loom.warping ? undefined : warping,
  });
  const { warpYarn, yarns } = readYarns(typed, pattern, faults);
  return present({
    loom: Object.keys(loom).length === 0 ? undefined : loom,
    widthMm: length(WIDTH),
    endsTogether: together === (pattern.warp.endsTogether ?? 1) ? undefined : together,
    warpYarn,
    yarns: Object.keys(yarns).length === 0 ? undefined : yarns,
  });
}

/** What she chose in words; a way of winding that her kind of loom does not take, or rows it does not have, go unheard. */
export function chosenLoom({ texts }: Pick<TypedMine, 'texts'>): { readonly kind?: LoomKindName; readonly nailRows?: NailRows; readonly warping?: Warping } {
  const kind = LOOM_KIND_NAMES.find((name) => name === textOf(texts, LOOM_KIND.key));
  const { rows, warpings } = loomKind(present({ kind }));
  return present({
    kind,
    nailRows: rows === 2 ? NAIL_ROW_NAMES.find((name) => name === textOf(texts, NAIL_ROWS.key)) : undefined,
    warping: warpings.find((way) => way === textOf(texts, WARPING.key)),
  });
}

const endsOf = (text: string): EndsTogether | undefined => (text === '2' ? 2 : text === '1' ? 1 : undefined);

/** Her own yarns, read as those of any piece are. */
function readYarns(typed: TypedMine, pattern: FrameLoomPiece, faults: Map<string, string>): Pick<MyPiece, 'warpYarn'> & Required<Pick<MyPiece, 'yarns'>> {
  const roles = Object.keys(pattern.yarns).filter((role) => isOwnYarn(yarnOf(typed, role)));
  const rows = roles.map((role, id) => ({ id, texts: { ...yarnOf(typed, role), role } }));
  const { piece, faults: found } = readTyped({ units: typed.units, texts: {}, warpYarn: typed.warpYarn, yarns: rows, bands: [] });
  const hasOwnWarp = isOwnYarn(typed.warpYarn);
  const places = [...rows.map(({ id, texts }) => [`yarns.${String(id)}.`, `yarns.${texts.role}.`] as const), ...(hasOwnWarp ? [[WARP_YARN, WARP_YARN] as const] : [])];
  for (const [from, to] of places) {
    for (const key of YARN_KEYS) {
      const fault = found.get(`${from}${key}`);
      if (fault !== undefined) faults.set(`${to}${key}`, fault.says);
    }
  }
  // Whatever was typed goes on as it is: reckoning it tells what is wrong with it.
  const { warp, yarns } = piece as { warp: { yarn: NonNullable<MyPiece['warpYarn']> }; yarns: NonNullable<MyPiece['yarns']> };
  return { yarns, ...(hasOwnWarp ? { warpYarn: warp.yarn } : {}) };
}

const FIELD_OF: Readonly<Record<string, string>> = {
  '/loom': WAY_KEY,
  '/bands': WAY_KEY,
  '/loom/insideWidthMm': INSIDE_WIDTH.key,
  '/loom/insideHeightMm': INSIDE_HEIGHT.key,
  '/loom/nailPitchMm': NAIL_PITCH.key,
  '/loom/warping': WARPING.key,
  '/loom/kind': LOOM_KIND.key,
  '/loom/nailRows': NAIL_ROWS.key,
  '/size/widthMm': WIDTH.key,
  '/warp/endsTogether': ENDS.key,
  '/warp/parity': ENDS.key,
  '/warp/endCount': ENDS.key,
};

function fieldOf(path: string, pattern: FrameLoomPiece): string {
  const known = FIELD_OF[path] ?? wovenFieldOf(path);
  if (known !== undefined) return known;
  const [, first, role = '', ...keys] = path.split('/');
  const key = YARN_KEYS.find((known) => known === keys.join('.')) ?? (keys[0] === 'ball' ? 'ball.metres' : 'grist');
  if (first === 'warp' && role === 'yarn') return `${WARP_YARN}${key}`;
  if (first !== 'yarns' || !Object.hasOwn(pattern.yarns, role)) return '';
  return `yarns.${role}.${key}`;
}

/** With the names of their fields, each sentence once a field. */
export function placed(problems: readonly Problem[], pattern: FrameLoomPiece): MineFound[] {
  const once = [...new Map(problems.map((problem) => [`${fieldOf(problem.path, pattern)} ${problem.message}`, problem])).values()];
  return once.map(({ path, message, code }) => ({ field: fieldOf(path, pattern), says: message, code }));
}
