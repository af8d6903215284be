/** Who may do what with a piece that is off the loom. Its maker alone, while she has the seat. */

export interface FinishFacts {
  readonly hasSeat: boolean;
  /** Every part is done, as the series counts it. */
  readonly hasFinished: boolean;
  /** She says that it is made, whatever the parts say. */
  readonly saysSo: boolean;
}

/** Photo, hours, yarn, label. */
export function mayWriteDown({ hasSeat, hasFinished, saysSo }: FinishFacts): boolean {
  return hasSeat && (hasFinished || saysSo);
}
