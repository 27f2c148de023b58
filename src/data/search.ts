/* The full-text search over documents and cases, which skips what shows results to someone who may not see them. */
import { type Id } from '@domain/case';
import { type Db } from './connection';
import { insertMany } from './mapping';
import { SEARCH_PAGES, type SearchPage } from './tables/registers';

export type { SearchPage } from './tables/registers';

/** A found page; the snippet in pieces, those that match marked. */
export type Found = {
  kind: string;
  ofId: Id;
  place: string;
  title: string;
  snippet: { text: string; hit: boolean }[];
};

const OPEN = '\u0002';
const SHUT = '\u0003';

/** Replaces the search pages of a document or case. */
export async function writeSearch(trx: Db, ofId: Id, pages: readonly Omit<SearchPage, 'ofId'>[]): Promise<void> {
  await trx(SEARCH_PAGES.name).where({ of_id: ofId }).delete();
  const rows = pages.map((page) => ({ ...page, ofId }));
  await insertMany(trx, SEARCH_PAGES, rows);
}

/** Each word must be there, as a beginning; quoting keeps the search's own operators out. */
function expression(text: string): string | null {
  const words = text.match(/[\p{L}\p{N}]+(?:[-./][\p{L}\p{N}]+)*/gu) ?? [];
  return words.length > 0 ? words.slice(0, 8).map((word) => `"${word}"*`).join(' ') : null;
}

function pieces(snippet: string): Found['snippet'] {
  return snippet
    .split(new RegExp(`(${OPEN}[^${SHUT}]*${SHUT})`, 'u'))
    .filter((text) => text !== '')
    .map((text) => (text.startsWith(OPEN) ? { text: text.slice(1, -1), hit: true } : { text, hit: false }));
}

/**
 * Pages of a site that hold every word, best first; a title weighs more.
 * @param hidden documents and cases whose results the asker may not see
 */
export async function search(
  db: Db,
  siteId: Id,
  text: string,
  options: { hidden?: ReadonlySet<Id>; limit?: number } = {},
): Promise<Found[]> {
  const words = expression(text);
  if (words === null) return [];
  const query = db('search')
    .join('search_pages as p', 'p.id', 'search.rowid')
    .whereRaw('search MATCH ?', [words])
    .where('p.site_id', siteId)
    .select('p.kind', 'p.of_id', 'p.place', 'p.title')
    .select(db.raw(`snippet(search, 1, ?, ?, '…', 16) AS snippet`, [OPEN, SHUT]))
    .orderByRaw('bm25(search, 8.0, 1.0)')
    .limit(options.limit ?? 30);
  const hidden = [...(options.hidden ?? [])];
  if (hidden.length > 0) void query.where((one) => one.where('p.hides', 0).orWhereNotIn('p.of_id', hidden));
  const rows = (await query) as { kind: string; of_id: Id; place: string; title: string; snippet: string }[];
  return rows.map((row) => ({
    kind: row.kind,
    ofId: row.of_id,
    place: row.place,
    title: row.title,
    snippet: pieces(row.snippet),
  }));
}
