declare module 'integrate-adaptive-simpson' {
  export default function integrate(f: (x: number) => number, from: number, to: number, tolerance?: number, maxDepth?: number): number;
}
declare module 'js-quantities' {
  export default class Qty {
    constructor(text: string);
    to(unit: string): Qty;
    readonly scalar: number;
  }
}
