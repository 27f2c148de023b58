/* A page that is not there: the page that says so, or the way to the tag that the thing has now. */
import { type AstroGlobal } from 'astro';
import { type Problem } from '@domain/result';

/** Answers a page's UNKNOWN: a renamed tag leads on (308), everything else is the page 404. */
export function missing(
  page: Pick<AstroGlobal, 'url' | 'params' | 'redirect' | 'rewrite'>,
  problem: Problem,
): Response | Promise<Response> {
  const tag = page.params['tag'];
  if (typeof problem.present !== 'string' || tag === undefined) return page.rewrite('/404');
  const { pathname, search } = page.url;
  const part = `/systems/${encodeURIComponent(tag)}`;
  const now = `/systems/${encodeURIComponent(problem.present)}`;
  return page.redirect(`${pathname.replace(part, now)}${search}`, 308);
}
