/* The first visit of an empty installation: site, rules in effect, first coordinator; once only. */
import { beforeEach, describe, expect, test } from 'vitest';
import * as auth from '@auth/index';
import { parseSiteRules, judgementHash } from '@domain/rules';
import { type Db } from '@data/connection';
import { findSiteBySlug, rulesInEffect } from '@data/site';
import { readTrail } from '@data/trail';
import { firstSiteSchema, type FirstSite } from '@services/administer/bodies';
import { makeFirstSite } from '@services/administer/first-site';
import { freshDatabase } from '../../support/database';

const BODY: FirstSite = {
  site: 'Marlpit Works',
  slug: 'marlpit',
  letters: 'MP',
  zone: 'Europe/Lisbon',
  barometer: { value: '99.5', unit: 'kPa_abs' },
  name: 'Ines Tavares',
  email: 'Ines@marlpit.example',
  password: 'slow water over brick',
};
const FROM = { ip: '10.0.0.1', agent: 'Test browser' };
let db: Db;
let context: auth.Auth;

beforeEach(async () => {
  db = await freshDatabase();
  context = auth.openAuth(db, { secure: false });
});

describe('the first visit', () => {
  test('makes the site with the rulebook’s defaults in effect at its own barometer, and signs the coordinator in', async () => {
    const made = await makeFirstSite(context, BODY, FROM);
    if (!made.ok) throw new Error(made.problem.detail);
    const site = (await findSiteBySlug(db, 'marlpit'))!;
    expect(site).toMatchObject({
      name: 'Marlpit Works',
      timeZone: 'Europe/Lisbon',
      facts: { caseLetters: 'MP' },
    });
    const rules = (await rulesInEffect(db, site.id))!;
    const body = parseSiteRules(rules.body);
    if (!body.ok) throw new Error(body.problem.detail);
    expect(body.value.judgement.barometer).toEqual({ value: 99.5, unit: 'kPa_abs' });
    expect(rules.judgementHash).toBe(judgementHash(body.value.judgement));
    const current = await auth.whoAsks(context, made.value.cookie);
    expect(auth.rolesAt(current!, 'marlpit')).toEqual(['coordinator']);
    const trail = await readTrail(db, site.id);
    expect(trail.map((entry) => [entry.act, entry.byId])).toEqual([
      ['person.first-coordinator', current!.person.id],
    ]);
    expect(JSON.stringify(trail)).not.toContain(BODY.password);
  });

  test('is over as soon as anyone exists', async () => {
    await makeFirstSite(context, BODY, FROM);
    const again = { ...BODY, slug: 'second', email: 'second@marlpit.example' };
    expect(await makeFirstSite(context, again, FROM)).toMatchObject({ problem: { code: 'NOT_PERMITTED' } });
    expect(await findSiteBySlug(db, 'second')).toBeUndefined();
  });

  test.each([
    [
      'an impossible barometer',
      { barometer: { value: '12', unit: 'bar_abs' } },
      'VALUE_IMPOSSIBLE',
      'barometer/value',
    ],
    ['no number', { barometer: { value: 'low', unit: 'bar_abs' } }, 'SCHEMA', 'barometer/value'],
    ['a gauge pressure', { barometer: { value: '1', unit: 'bar_g' } }, 'SCHEMA', 'barometer/value'],
    ['a short password', { password: 'short' }, 'SCHEMA', 'password'],
  ])('refuses %s beside its field and writes nothing', async (_what, part, code, path) => {
    expect(await makeFirstSite(context, { ...BODY, ...part }, FROM)).toMatchObject({
      problem: { code, errors: [{ path }] },
    });
    expect(await db('sites').first()).toBeUndefined();
    expect(await db('people').first()).toBeUndefined();
  });

  test.each([
    [{ slug: 'Marl pit' }, 'slug'],
    [{ slug: '../etc' }, 'slug'],
    [{ letters: 'marlp' }, 'letters'],
    [{ zone: 'Moon/Mare' }, 'zone'],
    [{ name: '' }, 'name'],
  ])('takes no %o', (part, path) => {
    const parsed = firstSiteSchema.safeParse({ ...BODY, ...part });
    expect(parsed.error?.issues.map((issue) => issue.path.join('.'))).toEqual([path]);
  });
});
