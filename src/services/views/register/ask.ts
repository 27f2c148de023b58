/* What a register's address asks for: words, filters, order, page, units. */
import { hasColumn, type RegisterName, type RegisterQuery } from '@data/registers';
import { type Actor } from '../../context';
import { type Hidden } from '../../hidden-view';

export const PAGE_SIZE = 50;
export const VERDICTS = ['adequate', 'marginal', 'inadequate', 'not-sized'] as const;

/** In which units figures stand: as the basis has them, or all in one system. */
export type Figures = 'entered' | 'SI' | 'US';

/** The address of a register, read. */
export type Ask = {
  text: string;
  unit: string;
  kind: string;
  verdict: string;
  sort: string;
  descending: boolean;
  after: string;
  /** The row before which the page ends; counts before `after`. */
  before: string;
  /** Number of the first row, for "51–100 of 212". */
  first: number;
  figures: Figures;
};

/** Reads the query of a register's address; what cannot be read counts as not asked. */
export function readAsk(name: RegisterName, query: URLSearchParams): Ask {
  const get = (key: string) => (query.get(key) ?? '').slice(0, 300);
  const sort = get('sort');
  const column = sort.replace(/^-/, '');
  const first = Number.parseInt(get('n'), 10);
  const figures = get('figures');
  const after = get('after');
  const before = get('before');
  return {
    text: get('q').trim(),
    unit: get('unit'),
    kind: get('kind'),
    verdict: VERDICTS.find((one) => one === get('verdict')) ?? '',
    sort: hasColumn(name, column) ? column : 'tag',
    descending: hasColumn(name, column) && sort.startsWith('-'),
    after,
    before,
    first: after + before !== '' && first > 1 && first < 1e6 ? first : 1,
    figures: figures === 'SI' || figures === 'US' ? figures : 'entered',
  };
}

/** The query of the data layer that an address asks for; results of hidden documents are left out before sort and filter. */
export function queryOf(ask: Ask, actor: Actor, hidden: Hidden, kindColumn: string): RegisterQuery {
  return {
    siteId: actor.site.id,
    hidden: hidden.documents,
    sort: ask.sort,
    direction: ask.descending ? 'desc' : 'asc',
    text: ask.text,
    limit: PAGE_SIZE,
    ...(ask.after === '' ? {} : { cursor: ask.after }),
    ...(ask.before === '' ? {} : { before: ask.before }),
    filters: {
      ...(ask.unit === '' ? {} : { unitId: ask.unit }),
      ...(ask.kind === '' ? {} : { [kindColumn]: ask.kind }),
      ...(ask.verdict === '' ? {} : { verdict: ask.verdict }),
    },
  };
}
