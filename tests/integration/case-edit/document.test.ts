/* Editing a working revision through its endpoint: permission first, versions, impossible figures, units, and the hidden view. */
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { getAt, type Basis } from '@domain/basis';
import { type Db } from '@data/connection';
import { GET, PATCH } from '@/pages/api/v1/sites/[site]/cases/[number]/documents/[tag]';
import { GET as show } from '@/pages/api/v1/sites/[site]/cases/[number]/index';
import { casePage } from '@services/views/case/frame';
import { changesView } from '@services/views/case/changes';
import { differencesView } from '@services/views/case/differences';
import { scenariosView } from '@services/views/case/scenarios';
import { findPersonByEmail } from '@data/people';
import { findSiteBySlug } from '@data/site';
import { ask, seededDatabase, SITE, told } from './seeded';

let db: Db;
beforeAll(async () => {
  db = await seededDatabase();
}, 180_000);
afterAll(async () => {
  await db.destroy();
});

const AT = { number: 'KW-2026-005', tag: 'SYS-302' };
const SET = 'reliefPoints/rp_psv306/set';
const OWN = { who: 'pavel.dostrun', params: AT };

async function working(): Promise<{ version: number; document: Basis }> {
  return (await told(await ask(db, GET, OWN))) as { version: number; document: Basis };
}

async function patchForm(fields: readonly (readonly [string, string])[], version?: number) {
  const at = version ?? (await working()).version;
  return ask(db, PATCH, { ...OWN, method: 'PATCH', form: [...fields, ['_version', String(at)]] });
}

describe('who may edit', () => {
  const json = { ops: 'nonsense' };
  it('nobody without a sign-in, no stranger to the seat, no one on an unknown case', async () => {
    expect((await ask(db, PATCH, { method: 'PATCH', params: AT, json })).status).toBe(401);
    const other = await ask(db, PATCH, { who: 'owen.tarrant', method: 'PATCH', params: AT, json });
    expect(await told(other)).toMatchObject({ code: 'NOT_PERMITTED', status: 403 });
    const unknown = { ...AT, number: 'KW-2026-999' };
    expect((await ask(db, PATCH, { ...OWN, method: 'PATCH', params: unknown, json })).status).toBe(404);
  });
  it('no one in another stage: the case is with its approvers', async () => {
    const later = { number: 'KW-2026-003', tag: 'SYS-401' };
    const originators = ['owen.tarrant', 'pavel.dostrun', 'hedda.brannick', 'neil.castering'];
    const codes = await Promise.all(
      originators.map(
        async (who) =>
          (await told(await ask(db, PATCH, { who, method: 'PATCH', params: later, json })))['code'],
      ),
    );
    expect(codes).toContain('WRONG_STAGE');
    expect(codes.every((code) => code === 'WRONG_STAGE' || code === 'NOT_PERMITTED')).toBe(true);
  });
});

describe('operations', () => {
  it('need a version, and a list of the right shape', async () => {
    const op = { op: 'set', path: SET, value: { value: 99, unit: 'psig' } };
    expect((await ask(db, PATCH, { ...OWN, method: 'PATCH', json: { ops: [op] } })).status).toBe(428);
    const headers = { 'If-Match': `"revision-${String((await working()).version)}"` };
    const bad = await ask(db, PATCH, {
      ...OWN,
      method: 'PATCH',
      headers,
      json: { ops: [{ op: 'paint', path: SET }] },
    });
    expect(await told(bad)).toMatchObject({ code: 'SCHEMA', errors: [{ path: 'ops/0/op' }] });
  });
  it('refuse an older version with the present one, and write nothing', async () => {
    const { version } = await working();
    const headers = { 'If-Match': `"revision-${String(version + 5)}"` };
    const json = { ops: [{ op: 'set', path: SET, value: { value: 99, unit: 'psig' } }] };
    const stale = await ask(db, PATCH, { ...OWN, method: 'PATCH', headers, json });
    expect(stale.status).toBe(412);
    expect(await told(stale)).toMatchObject({ code: 'STALE', present: { version } });
    expect((await working()).version).toBe(version);
  });
  it('refuse a physically impossible figure beside its field, and write nothing', async () => {
    const { version } = await working();
    const headers = { 'If-Match': `"revision-${String(version)}"` };
    const json = { ops: [{ op: 'set', path: 'fluids/fl_gasv304/T', value: { value: -600, unit: 'degF' } }] };
    const refused = await ask(db, PATCH, { ...OWN, method: 'PATCH', headers, json });
    expect(refused.status).toBe(422);
    expect(await told(refused)).toMatchObject({
      code: 'VALUE_IMPOSSIBLE',
      errors: [{ path: 'fluids/fl_gasv304/T' }],
    });
    expect((await working()).version).toBe(version);
  });
});

describe('forms', () => {
  it('read a figure typed with a unit of its own, and keep its new origin', async () => {
    const saved = await patchForm([
      [`set.${SET}`, '6.5 barg'],
      [`unit.${SET}`, 'psig'],
      [`origin.${SET}.kind`, 'judgement'],
      [`origin.${SET}.ref`, 'Operating margin'],
    ]);
    expect(saved.status).toBe(200);
    expect(getAt((await working()).document, SET)).toMatchObject({
      value: 6.5,
      unit: 'bar_g',
      origin: { kind: 'judgement', ref: 'Operating margin' },
    });
  });
  it('tell a bare bar apart beside its field', async () => {
    const refused = await patchForm([[`set.${SET}`, '6.5 bar']]);
    expect(await told(refused)).toMatchObject({
      code: 'UNIT_AMBIGUOUS',
      status: 422,
      errors: [{ path: SET }],
    });
  });
  it('refuse an impossible figure and what is no number together, each beside its field', async () => {
    const { version } = await working();
    const refused = await told(
      await patchForm([
        ['set.fluids/fl_gasv304/T', '-600'],
        ['unit.fluids/fl_gasv304/T', 'degF'],
        [`set.${SET}`, 'much'],
      ]),
    );
    const paths = (refused['errors'] as { path: string }[]).map((error) => error.path);
    expect(paths.sort()).toEqual(['fluids/fl_gasv304/T', SET].sort());
    expect((await working()).version).toBe(version);
  });
  it('say what stands now in each field when they are stale', async () => {
    const stale = await told(await patchForm([[`set.${SET}`, '7 barg']], 1000));
    expect(stale).toMatchObject({ code: 'STALE', present: { [SET]: '6.5' } });
  });
  it('decide a scenario with reason, statuses and sentence, and add and take away an answer', async () => {
    const id = 'loss-of-cooling';
    const found = (await working()).document.scenarios.find(
      (one) => one.key === id || one.disposition === 'not-credible',
    );
    const at = `scenarios/${found?.id ?? ''}`;
    await patchForm([
      [`flags.${at}/statuses[]`, ''],
      [`flags.${at}/statuses[]`, 'normal'],
      [`set.${at}/disposition`, 'credible'],
      [`set.${at}/reason`, 'The cooler stops while the feed goes on.'],
    ]);
    const decided = getAt((await working()).document, at) as Basis['scenarios'][number];
    expect(decided.disposition).toBe('credible');
    expect(decided.statuses).toMatchObject({ normal: true, 'start-up': false });
    await patchForm([
      ['add', `${at}/answers`],
      ['new.load', 'given'],
      ['new.size', 'method:a.gas'],
      ['new.group', 'gr_g1'],
      ['new.accumulation', 'single'],
    ]);
    const answer = (getAt((await working()).document, at) as Basis['scenarios'][number]).answers[0];
    expect(answer).toMatchObject({ load: { by: 'given' }, size: { by: 'method', method: 'a.gas' } });
    const path = `${at}/answers/${answer?.id ?? ''}`;
    await patchForm([[`set.${path}/load/figure`, '1200 kg/h']]);
    expect(getAt((await working()).document, `${path}/load/figure`)).toMatchObject({
      value: 1200,
      unit: 'kg/h',
    });
    await patchForm([['remove', path]]);
    expect(getAt((await working()).document, path)).toBeUndefined();
  });
  it('refuse a form that changes nothing', async () => {
    const refused = await patchForm([
      [`set.${SET}`, '6.5'],
      [`unit.${SET}`, 'bar_g'],
    ]);
    expect(await told(refused)).toMatchObject({ code: 'SCHEMA' });
  });
});

describe('the hidden view of the checker', () => {
  const HIDDEN = { number: 'KW-2026-005', tag: 'SYS-302' };
  it('gets no working document to evaluate', async () => {
    const refused = await ask(db, GET, { who: 'ilse.fennimore', params: HIDDEN });
    expect(await told(refused)).toMatchObject({ code: 'HIDDEN', status: 409 });
    const view = await told(
      await ask(db, show, { who: 'ilse.fennimore', params: { number: HIDDEN.number } }),
    );
    expect(view).toMatchObject({ hidden: true });
    expect(view['brief']).toBeUndefined();
  });
  it('shows no load, area, verdict or letter in scenarios, changes and differences', async () => {
    const site = await findSiteBySlug(db, SITE);
    const person = await findPersonByEmail(db, 'ilse.fennimore@ketterwold.example');
    if (!site || !person) throw new Error('The invented site is incomplete.');
    const ctx = { db, now: () => new Date(), baseUrl: 'https://setwright.example' };
    const actor = { person, site, roles: ['checker' as const], standsFor: [] };
    const opened = await casePage(ctx, actor, HIDDEN.number);
    if (!opened.ok) throw new Error(opened.problem.detail);
    const { of } = opened.value;
    const [scenarios, changes, differences] = await Promise.all([
      scenariosView(of, null),
      changesView(of, null),
      differencesView(of, null),
    ]);
    if (!scenarios.ok || !changes.ok || !differences.ok) throw new Error('A part is missing.');
    expect(scenarios.value.scale).toBeNull();
    expect(
      scenarios.value.lines.some((line) => line.load ?? line.required ?? line.verdict ?? line.area),
    ).toBe(false);
    expect(scenarios.value.scenarios.flatMap((one) => one.answers).some((one) => one.result)).toBe(false);
    const letters = changes.value.sections
      .flatMap((section) => section.elements.flatMap((element) => element.fields))
      .filter((field) => field.path.endsWith('orifice/letter'));
    expect(letters.length).toBeGreaterThan(0);
    expect(letters.every((field) => field.now === '[hidden]')).toBe(true);
    expect(differences.value.moved).toEqual([]);
    expect(changes.value.changed.every((line) => line.now === '[hidden]')).toBe(true);
  });
});
