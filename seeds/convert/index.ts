/* The public face of the converter: from the invented site's file to documents and registers of ours. */
import rawResults from '../data/ketterwold-results.json';
import rawSite from '../data/ketterwold.json';
import { type DemoQ, type DemoResults, type DemoSite, type DemoSystem } from './demo-types';

/** Stored results beside the site: of every system as it stands, of cases before and after, of headers. */
export type StoredResults = {
  systems: Record<string, DemoResults>;
  cases: Record<string, Record<'before' | 'after', Record<string, DemoResults>>>;
  headers: Record<string, Record<string, { total_flow: DemoQ; nodes: Record<string, DemoQ> }>>;
};

/** The invented site as it was written down. */
export const SITE = rawSite as unknown as DemoSite;
/** The stored results of its calculations. */
export const RESULTS = rawResults as unknown as StoredResults;

/** A system of the invented site by its tag. Throws for a tag that is not there: a bug. */
export function systemOf(tag: string): DemoSystem {
  const found = SITE.systems.find((system) => system.id === tag);
  if (!found) throw new Error(`the invented site has no system ${tag}`);
  return found;
}

/** The stored results of a system; empty when there are none. */
export function resultsOf(tag: string): DemoResults {
  return RESULTS.systems[tag] ?? { causes: {}, devices: {} };
}

export { basisOf } from './basis';
export { fittedOf, type Fitted } from './fitted';
export { headerOf, causeId } from './header';
export * from './ids';
export { pointId } from './points';
export { groupId } from './groups';
export { answerId } from './answers';
export { scenarioKey } from './keys';
export { compact, figureOf, plainQ, rich } from './figures';
export type * from './demo-types';
