/* Finding a tag, a system or a case by its words; pages that show results of hidden documents are not searched. */
import { ok, type Result } from '@domain/result';
import { type Found, search } from '@data/search';
import { maskProse } from '@domain/hidden';
import { type Actor, type Ctx } from '../context';
import { type Hidden, hiddenOf } from '../hidden-view';

export type FoundLine = {
  title: string;
  href: string;
  kind: string;
  snippet: { text: string; hit: boolean }[];
};
export type SearchView = { asked: string; lines: FoundLine[] };

const KINDS: Record<string, string> = {
  system: 'System',
  scenarios: 'Scenarios of a system',
  'relief-point': 'Relief point',
  case: 'Case',
  header: 'Header',
};

function lineOf(found: Found, site: string, hidden: Hidden): FoundLine {
  const withheld = hidden.cases.has(found.ofId) || hidden.documents.has(found.ofId);
  const shown = (text: string) => (withheld ? maskProse(text) : text);
  return {
    title: shown(found.title),
    href: `/s/${site}/${found.place}`,
    kind: KINDS[found.kind] ?? found.kind,
    snippet: found.snippet.map((piece) => ({ ...piece, text: shown(piece.text) })),
  };
}

/** What a site has for some words, best first. */
export async function searchView(ctx: Ctx, actor: Actor, words: string): Promise<Result<SearchView>> {
  const asked = words.trim().slice(0, 200);
  const hidden = await hiddenOf(ctx, actor);
  const found = await search(ctx.db, actor.site.id, asked, {
    hidden: new Set([...hidden.cases, ...hidden.documents]),
  });
  return ok({ asked, lines: found.map((one) => lineOf(one, actor.site.slug, hidden)) });
}
