/** A browser's stores of answers, in memory: as much of them as the service worker uses. */
const ORIGIN = 'http://house.example';
const keyOf = (asked: RequestInfo | URL): string => new URL(asked instanceof Request ? asked.url : String(asked), ORIGIN).href;

class FakeCache {
  readonly answers = new Map<string, Response>();
  async match(asked: RequestInfo | URL, { ignoreSearch = false } = {}): Promise<Response | undefined> {
    const plain = (address: string): string => (ignoreSearch ? address.split('?', 1)[0] ?? '' : address);
    const found = [...this.answers].find(([address]) => plain(address) === plain(keyOf(asked)));
    return found?.[1].clone();
  }
  async put(asked: RequestInfo | URL, answer: Response): Promise<void> { this.answers.set(keyOf(asked), answer); }
  async delete(asked: RequestInfo | URL): Promise<boolean> { return this.answers.delete(keyOf(asked)); }
  async keys(): Promise<Request[]> { return [...this.answers.keys()].map((address) => new Request(address)); }
}

export class FakeCaches {
  readonly stores = new Map<string, FakeCache>();
  async open(name: string): Promise<Cache> {
    const store = this.stores.get(name) ?? new FakeCache();
    this.stores.set(name, store);
    return store as unknown as Cache;
  }
  async delete(name: string): Promise<boolean> { return this.stores.delete(name); }
  async keys(): Promise<string[]> { return [...this.stores.keys()]; }
  /** Addresses in a store, without the host. */
  in(name: string): string[] { return [...this.stores.get(name)?.answers.keys() ?? []].map((address) => address.slice(ORIGIN.length)).sort(); }
}
