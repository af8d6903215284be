/** A drawing put together in levels: what lies higher is drawn later, in whatever order it was said. */

export const LEVEL = {
  ground: 0,
  /** Weft behind the warp. */
  behind: 10,
  warp: 20,
  /** Weft in front of the warp. */
  front: 30,
  above: 40,
  tool: 50,
  marks: 60,
  words: 70,
} as const;

export class Scene {
  readonly #laid: { readonly level: number; readonly markup: string }[] = [];
  /** Begins every id a figure defines. */
  readonly id: string;

  constructor(id: string) {
    this.id = id;
  }

  add(level: number, markup: string): this {
    if (markup !== '') this.#laid.push({ level, markup });
    return this;
  }

  markup(): string {
    return [...this.#laid]
      .sort((a, b) => a.level - b.level)
      .map((item) => item.markup)
      .join('');
  }
}
