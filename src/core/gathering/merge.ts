/**
 * The gathering lists of several parts as one list to shop by: the same yarn or tool once, with the parts it is for.
 */
export interface GatheringLine {
  readonly publicId: string;
  readonly part: number;
  readonly kind: 'tool' | 'yarn' | 'material';
  readonly name: string;
  readonly amountKey: string | null;
  readonly amountText: string | null;
  readonly standIn: string | null;
  readonly untilPart: number | null;
  readonly note: string | null;
  readonly lookOut: string | null;
  readonly getFrom: string | null;
  readonly ticked: boolean;
}

export interface MergedLine extends Omit<GatheringLine, 'publicId' | 'part'> {
  /** Of the lines that were put together, in the order of the parts. */
  readonly publicIds: readonly string[];
  readonly parts: readonly number[];
}

/**
 * Lines are the same when they are of one kind and name the same amount of a yarn, or have the same name. The words
 * kept are those of the first part that has any; a thing is gathered once, so it is ticked as soon as one part's line is;
 * needed until the last of all.
 */
export function mergeLines(lines: readonly GatheringLine[]): MergedLine[] {
  const merged = new Map<string, MergedLine>();
  for (const { publicId, part, ...line } of lines) {
    const key = `${line.kind} ${line.kind === 'yarn' && line.amountKey !== null ? line.amountKey : line.name.toLowerCase()}`;
    const before = merged.get(key);
    merged.set(key, before === undefined ? { ...line, publicIds: [publicId], parts: [part] } : {
      kind: line.kind,
      name: before.name,
      amountKey: before.amountKey ?? line.amountKey,
      amountText: before.amountText ?? line.amountText,
      standIn: before.standIn ?? line.standIn,
      note: before.note ?? line.note,
      lookOut: before.lookOut ?? line.lookOut,
      getFrom: before.getFrom ?? line.getFrom,
      untilPart: before.untilPart === null || line.untilPart === null ? (before.untilPart ?? line.untilPart) : Math.max(before.untilPart, line.untilPart),
      ticked: before.ticked || line.ticked,
      publicIds: [...before.publicIds, publicId],
      parts: before.parts.includes(part) ? before.parts : [...before.parts, part],
    });
  }
  return [...merged.values()];
}
