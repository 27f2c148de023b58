/* Sites with their units and utilities; sets of site rules. */
import { type Id } from '@domain/case';
import { type Db } from './connection';
import { findAll, findIn, findOne, insert, type New, updateVersioned, updateWhere } from './mapping';
import { SITE_RULES, type SiteRulesRow } from './tables/documents';
import { type SiteRow, SITES, type UnitRow, UNITS, UTILITIES, type UtilityRow } from './tables/people';

export type { RulesState, SiteRulesRow } from './tables/documents';
export type { SiteRow, UnitRow, UtilityRow } from './tables/people';

/** Adds a site. */
export function createSite(trx: Db, row: New<SiteRow>): Promise<void> {
  return insert(trx, SITES, row);
}

/** A site by its id. */
export function findSite(db: Db, id: Id): Promise<SiteRow | undefined> {
  return findOne(db, SITES, { id });
}

/** A site by the name in its addresses. */
export function findSiteBySlug(db: Db, slug: string): Promise<SiteRow | undefined> {
  return findOne(db, SITES, { slug });
}

/** Sites by their ids. */
export function findSites(db: Db, ids: readonly Id[]): Promise<SiteRow[]> {
  return findIn(db, SITES, 'id', ids);
}

/** All sites by name. */
export function listSites(db: Db): Promise<SiteRow[]> {
  return findAll(db, SITES, {}, 'name');
}

/** Changes a site at the version that was read; false when another write came first. */
export function updateSite(trx: Db, id: Id, version: number, patch: Partial<SiteRow>): Promise<boolean> {
  return updateVersioned(trx, SITES, id, version, patch);
}

/** Adds a unit. */
export function createUnit(trx: Db, row: New<UnitRow>): Promise<void> {
  return insert(trx, UNITS, row);
}

/** The units of a site by tag. */
export function listUnits(db: Db, siteId: Id): Promise<UnitRow[]> {
  return findAll(db, UNITS, { siteId }, 'tag');
}

/** Changes a unit at the version that was read; false when another write came first. */
export function updateUnit(trx: Db, id: Id, version: number, patch: Partial<UnitRow>): Promise<boolean> {
  return updateVersioned(trx, UNITS, id, version, patch);
}

/** Adds a utility. */
export function createUtility(trx: Db, row: New<UtilityRow>): Promise<void> {
  return insert(trx, UTILITIES, row);
}

/** The utilities of a site by tag. */
export function listUtilities(db: Db, siteId: Id): Promise<UtilityRow[]> {
  return findAll(db, UTILITIES, { siteId }, 'tag');
}

/** Changes a utility at the version that was read; false when another write came first. */
export function updateUtility(trx: Db, id: Id, version: number, patch: Partial<UtilityRow>): Promise<boolean> {
  return updateVersioned(trx, UTILITIES, id, version, patch);
}

/** Adds a set of site rules. */
export function createRules(trx: Db, row: New<SiteRulesRow>): Promise<void> {
  return insert(trx, SITE_RULES, row);
}

/** A set of site rules by its id. */
export function findRules(db: Db, id: Id): Promise<SiteRulesRow | undefined> {
  return findOne(db, SITE_RULES, { id });
}

/** The site rules in effect. */
export function rulesInEffect(db: Db, siteId: Id): Promise<SiteRulesRow | undefined> {
  return findOne(db, SITE_RULES, { siteId, state: 'in-effect' });
}

/** All sets of site rules by number. */
export function listRules(db: Db, siteId: Id): Promise<SiteRulesRow[]> {
  return findAll(db, SITE_RULES, { siteId }, 'number');
}

/** Changes a set of site rules at the version that was read; false when another write came first. */
export function updateRules(trx: Db, id: Id, version: number, patch: Partial<SiteRulesRow>): Promise<boolean> {
  return updateVersioned(trx, SITE_RULES, id, version, patch);
}

/** Puts a signed set of site rules into effect; the former one is superseded. */
export async function putRulesIntoEffect(trx: Db, rules: SiteRulesRow): Promise<boolean> {
  await updateWhere(trx, SITE_RULES, { siteId: rules.siteId, state: 'in-effect' }, { state: 'superseded' });
  return updateRules(trx, rules.id, rules.version, { state: 'in-effect' });
}
