/**
 * What a series still lacks before students may come in. Pure: it is handed what there is, and says what is not,
 * in the order in which a teacher would mend it.
 */
export interface SeriesInHand {
  readonly title: string;
  readonly summary: string;
  readonly priceMinor: number | null;
  /** Whether the piece can be reckoned; null when there is none. */
  readonly pieceFits: boolean | null;
  readonly parts: readonly PartInHand[];
}

export interface PartInHand {
  readonly number: number;
  readonly title: string;
  /** Reasons why the text cannot be read; empty when it can. */
  readonly textProblems: readonly string[];
  readonly isEmpty: boolean;
  /** Keys of amounts, in text and gathering list, that the piece's plan does not give. */
  readonly unknownAmounts: readonly string[];
  /** Names of videos and pictures in the text that nobody has put in. */
  readonly unknownMedia: readonly string[];
  readonly opensAfterPart: number | null;
  readonly hasCheckpoint: boolean;
  readonly opensAt: Date | null;
}

export interface Missing {
  /** Which part it is about; null for the series as a whole. */
  readonly part: number | null;
  readonly says: string;
  /** True: it cannot be published so. False: worth a look. */
  readonly blocks: boolean;
}

export function whatIsMissing(series: SeriesInHand): Missing[] {
  const missing: Missing[] = [];
  const note = (part: number | null, blocks: boolean, says: string): void => { missing.push({ part, says, blocks }); };
  if (series.summary === '') note(null, true, 'The summary is missing. It is what people read first.');
  if (series.priceMinor === null) note(null, true, 'The price is missing. 0 makes it free.');
  if (series.pieceFits === null) note(null, true, 'The piece is not described yet, so no amount can be reckoned.');
  if (series.pieceFits === false) note(null, true, 'The piece cannot be woven as described. Open it to see why.');
  if (series.parts.length === 0) note(null, true, 'There is no part yet.');
  for (const part of series.parts) missing.push(...whatPartLacks(part, series.parts));
  return missing;
}

function whatPartLacks(part: PartInHand, all: readonly PartInHand[]): Missing[] {
  const missing: Missing[] = [];
  const note = (blocks: boolean, says: string): void => { missing.push({ part: part.number, says, blocks }); };
  if (part.isEmpty) note(true, 'Nothing is written yet.');
  for (const reason of part.textProblems) note(true, reason);
  for (const key of part.unknownAmounts) note(true, `The plan has no amount called ${key}.`);
  for (const name of part.unknownMedia) note(true, `There is no video or picture called ${name}.`);
  if (part.opensAfterPart !== null) {
    const earlier = all.find(({ number }) => number === part.opensAfterPart);
    if (part.opensAfterPart >= part.number) note(true, `It waits for Part ${part.opensAfterPart}, which comes later. Nobody could ever open it.`);
    else if (earlier?.hasCheckpoint !== true) note(true, `It waits for a verdict on Part ${part.opensAfterPart}, which asks for no photo.`);
  }
  const before = all.filter(({ number, opensAt }) => number < part.number && opensAt !== null && part.opensAt !== null && opensAt > part.opensAt);
  const [later] = before;
  if (later !== undefined) note(true, `It opens before Part ${later.number}. Parts open in their order.`);
  return missing;
}
