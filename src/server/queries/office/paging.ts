/** Long lists of the office come in pages of fifty. */
export const PAGE_LENGTH = 50;

export interface Paged<T> {
  readonly rows: readonly T[];
  readonly page: number;
  readonly pages: number;
  readonly total: number;
}

/** The page that was asked for by an address, 1 when it is no page. */
export function pageOf(asked: string | null): number {
  const page = /^\d{1,6}$/.test(asked ?? '') ? Number(asked) : 1;
  return Math.max(1, page);
}

/** Asks for one page of `total` rows; beyond the last page the last one is given. */
export async function paged<T>(asked: number, total: number, load: (limit: number, offset: number) => Promise<readonly T[]>): Promise<Paged<T>> {
  const pages = Math.max(1, Math.ceil(total / PAGE_LENGTH));
  const page = Math.min(asked, pages);
  return { rows: await load(PAGE_LENGTH, (page - 1) * PAGE_LENGTH), page, pages, total };
}
