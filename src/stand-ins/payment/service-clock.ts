/** The stand-in's own time: this machine's, moved on when a trial asks for it. */
export class ServiceClock {
  #aheadMs = 0;

  nowMs(): number {
    return Date.now() + this.#aheadMs;
  }

  /** Whole seconds since 1970, as the service counts. */
  now(): number {
    return Math.floor(this.nowMs() / 1000);
  }

  /** Time only goes forward. */
  advance(seconds: number): void {
    this.#aheadMs += Math.max(0, seconds) * 1000;
  }
}
