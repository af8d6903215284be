/**
 * What a series still lacks before students may come in. Pure: it is handed what there is, and says what is not,
 * in the order in which a teacher would mend it.
 */
import { contradictions, type ListedLine } from '#core/gathering/contradictions.ts';
import { listed } from '#core/listed.ts';
import { openingFaults, type PartOpening } from '#core/series/opening-faults.ts';
import { passingBy } from '#core/series/passing-by.ts';

export interface SeriesInHand {
  readonly title: string;
  readonly summary: string;
  readonly story: string;
  readonly techniques: readonly string[];
  readonly priceMinor: number | null;
  /** Whether the piece can be reckoned; null when there is none. */
  readonly pieceFits: boolean | null;
  readonly parts: readonly PartInHand[];
}

export interface TextRemark {
  readonly line: number;
  readonly reason: string;
}

export interface ListedThing extends Omit<ListedLine, 'part'> {
  readonly hasAmount: boolean;
}

/** Tools and stuff that can hurt; common practice, no source. */
const CAN_HURT = /\b(scissors|shears|kni(?:fe|ves)|scalpel|blades?|razor|awl|saws?|drill|hammer|rotary cutter|mordants?|caustic|acid)\b/i;

export interface PartInHand extends PartOpening {
  readonly title: string;
  readonly isPreview: boolean;
  /** Reasons why the text cannot be read; empty when it can. */
  readonly textProblems: readonly TextRemark[];
  /** Things in a readable text that its writer should look at. */
  readonly textWarnings: readonly TextRemark[];
  readonly isEmpty: boolean;
  readonly stepCount: number;
  /** Its gathering list, in order. */
  readonly list: readonly ListedThing[];
  /** A caution stands in its text. */
  readonly hasCaution: boolean;
  /** Its photo has words on what the teacher looks for; true without a photo. */
  readonly saysWhatToLookFor: boolean;
  /** Keys of amounts in the text that the piece's plan does not give. */
  readonly unknownAmounts: readonly string[];
  /** The same, of the gathering list. */
  readonly unknownListAmounts: readonly string[];
  /** Names of videos and pictures in the text that nobody has put in, or that are not ready yet. */
  readonly unknownMedia: readonly string[];
  /** Names of videos in the text that have no captions. */
  readonly uncaptionedVideos: readonly string[];
}

/** Where it is mended. */
export type MissingPlace = 'words' | 'price' | 'piece' | 'parts' | 'text' | 'list' | 'settings';

export interface Missing {
  /** Which part it is about; null for the series as a whole. */
  readonly part: number | null;
  readonly place: MissingPlace;
  /** Line of the part's text, where it is about one. */
  readonly line?: number;
  /** Public id of the line of its gathering list, where it is about one. */
  readonly item?: string;
  readonly says: string;
  /** True: it cannot be published so. False: worth a look. */
  readonly blocks: boolean;
}

/** First what blocks, then what is worth a look. */
export function whatIsMissing(series: SeriesInHand): Missing[] {
  const { parts } = series;
  const faults = openingFaults(parts);
  return [
    ...blocksSeries(series),
    ...parts.flatMap((part) => [...blocksPart(part), ...faults.filter((fault) => fault.part === part.number).map(({ says }) => needed(part.number, 'settings', says))]),
    ...worthALook(series),
  ];
}

const needed = (part: number | null, place: MissingPlace, says: string): Missing => ({ part, place, says, blocks: true });
const noticed = (part: number | null, place: MissingPlace, says: string): Missing => ({ part, place, says, blocks: false });

function blocksSeries({ summary, priceMinor, pieceFits, parts }: SeriesInHand): Missing[] {
  return [
    ...(summary === '' ? [needed(null, 'words', 'The summary is missing. It is what people read first.')] : []),
    ...(priceMinor === null ? [needed(null, 'price', 'The price is missing. 0 makes it free.')] : []),
    ...(pieceFits === null ? [needed(null, 'piece', 'The piece is not described yet, so no amount can be reckoned.')] : []),
    ...(pieceFits === false ? [needed(null, 'piece', 'The piece cannot be woven as described. Open it to see why.')] : []),
    ...(parts.length === 0 ? [needed(null, 'parts', 'There is no part yet.')] : []),
  ];
}

function blocksPart({ number, isEmpty, textProblems, unknownAmounts, unknownListAmounts, unknownMedia, uncaptionedVideos }: PartInHand): Missing[] {
  return [
    ...(isEmpty ? [{ ...needed(number, 'text', 'Nothing is written yet.'), line: 1 }] : []),
    ...textProblems.map(({ line, reason }) => ({ ...needed(number, 'text', `Line ${line}: ${reason}`), line })),
    ...unknownAmounts.map((key) => needed(number, 'text', `The text asks for the amount “${key}”, which the plan of the piece does not have.`)),
    ...unknownListAmounts.map((key) => needed(number, 'list', `The gathering list asks for the amount “${key}”, which the plan of the piece does not have.`)),
    ...unknownMedia.map((name) => needed(number, 'text', `There is no video or picture called “${name}” that is ready.`)),
    ...uncaptionedVideos.map((name) => needed(number, 'text', `The video “${name}” has no captions. Who cannot hear it would miss what you say.`)),
  ];
}

function worthALook({ story, techniques, parts }: SeriesInHand): Missing[] {
  const series = [
    ...(story === '' ? [noticed(null, 'words', 'Nothing tells yet what makes this piece worth weaving.')] : []),
    ...(techniques.length === 0 ? [noticed(null, 'words', 'No technique is named, so nobody finds the series by one.')] : []),
  ];
  if (parts.length === 0) return series;
  return [
    ...series,
    ...(parts.every(({ list }) => list.length === 0) ? [noticed(null, 'parts', 'No part has a gathering list, so nobody knows before paying what she needs.')] : []),
    ...(parts.every(({ isPreview }) => !isPreview) ? [noticed(null, 'parts', 'No part is free to read. One that is lets people see how you teach.')] : []),
    ...(parts.every(({ hasCheckpoint }) => !hasCheckpoint) ? [noticed(null, 'parts', 'No part asks for a photo, so you see no loom before it is too late to mend.')] : []),
    ...contradictions(parts.flatMap(({ number, list }) => list.map((line) => ({ ...line, part: number }))), parts.length).map(({ part, line, says }) => ({ ...noticed(part, 'list', says), item: line })),
    ...passingBy(parts).map(({ part, says }) => noticed(part, 'settings', says)),
    ...parts.flatMap(lookAtPart),
    ...parts.flatMap(({ number, isEmpty, textProblems, textWarnings, stepCount }) => [
      ...textWarnings.map(({ line, reason }) => ({ ...noticed(number, 'text', `Line ${line}: ${reason}`), line })),
      ...(!isEmpty && textProblems.length === 0 && stepCount === 0 ? [noticed(number, 'text', 'There is no step to tick.')] : []),
    ]),
  ];
}

function lookAtPart({ number, list, hasCaution, saysWhatToLookFor, isEmpty, textProblems }: PartInHand): Missing[] {
  const sharp = list.filter(({ name }) => CAN_HURT.test(name)).map(({ name }) => `“${name}”`);
  return [
    ...list.filter(({ hasAmount }) => !hasAmount).map(({ name, publicId }) => ({ ...noticed(number, 'list', `“${name}” has no amount, so nobody knows how much to bring.`), item: publicId })),
    ...(sharp.length > 0 && !hasCaution && !isEmpty && textProblems.length === 0 ? [noticed(number, 'text', `${listed(sharp)} can hurt, and no caution stands in the text.`)] : []),
    ...(saysWhatToLookFor ? [] : [noticed(number, 'settings', 'It asks for a photo and does not say what you look for in it.')]),
  ];
}
