/** What a text of a series can speak of, as the page hands it to the editor. */

export interface SayableAmount {
  readonly key: string;
  /** What it is: `Warp ends`. */
  readonly label: string;
  /** What it is at present, for the pattern piece: `66`. */
  readonly text: string;
}

export interface Choice {
  readonly value: string;
  readonly label: string;
}

export interface Sayable {
  /** Amounts of the plan, in the order of the craft. */
  readonly amounts: readonly SayableAmount[];
  readonly figures: readonly Choice[];
  /** Videos and pictures, as `video/<name>` and `picture/<name>`. */
  readonly media: readonly Choice[];
}
