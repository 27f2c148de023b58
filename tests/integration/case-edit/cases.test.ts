/* Raising, briefing and nominating through the endpoints: permission first, malformed bodies told, stale versions refused with what stands now. */
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { type Db } from '@data/connection';
import { peopleOfSite } from '@data/people';
import { findSiteBySlug } from '@data/site';
import { findCaseByNumber } from '@data/cases';
import { GET as list, POST as raise } from '@/pages/api/v1/sites/[site]/cases/index';
import { GET as show } from '@/pages/api/v1/sites/[site]/cases/[number]/index';
import { GET as canDo } from '@/pages/api/v1/sites/[site]/cases/[number]/can';
import { GET as openPoints } from '@/pages/api/v1/sites/[site]/cases/[number]/open-points';
import { PATCH as brief } from '@/pages/api/v1/sites/[site]/cases/[number]/brief';
import { POST as seats } from '@/pages/api/v1/sites/[site]/cases/[number]/seats';
import { POST as affected } from '@/pages/api/v1/sites/[site]/cases/[number]/affected';
import { POST as copy } from '@/pages/api/v1/sites/[site]/cases/[number]/copy';
import { ask, seededDatabase, SITE, told } from './seeded';

let db: Db;
beforeAll(async () => {
  db = await seededDatabase();
}, 180_000);
afterAll(async () => {
  await db.destroy();
});

const DRAFT = { number: 'KW-2026-016' };
const NEW = { class: 'permanent', title: 'P-101A impeller 246 to 258 mm', systems: ['SYS-101'] };

async function row(number: string) {
  const site = await findSiteBySlug(db, SITE);
  return findCaseByNumber(db, site?.id ?? '', number);
}

async function personId(name: string): Promise<string> {
  const site = await findSiteBySlug(db, SITE);
  const found = (await peopleOfSite(db, site?.id ?? '')).find((one) => one.name === name);
  if (!found) throw new Error(`No ${name}.`);
  return found.id;
}

describe('raising a case', () => {
  it('asks for a sign-in, then for a role at the site, then for the role of originator', async () => {
    expect((await ask(db, raise, { json: NEW })).status).toBe(401);
    expect((await ask(db, raise, { who: 'owen.tarrant', site: 'elsewhere', json: NEW })).status).toBe(404);
    const refused = await ask(db, raise, { who: 'ilse.fennimore', json: { nonsense: true } });
    expect(refused.status).toBe(403);
    expect(await told(refused)).toMatchObject({ code: 'NOT_PERMITTED' });
  });

  it.each<[string, Record<string, unknown>, number, string, string]>([
    ['an unknown system', { ...NEW, systems: ['SYS-999'] }, 422, 'SCHEMA', 'systems'],
    ['no title', { ...NEW, title: '' }, 422, 'SCHEMA', 'title'],
    ['a title of a thousand letters', { ...NEW, title: 'x'.repeat(1000) }, 422, 'SCHEMA', 'title'],
    ['a class that is not handled yet', { ...NEW, class: 'emergency' }, 422, 'SCHEMA', 'class'],
    ['no system', { class: 'permanent', title: 'A change' }, 422, 'SCHEMA', 'systems'],
  ])('refuses %s with its field', async (_what, json, status, code, path) => {
    const refused = await ask(db, raise, { who: 'owen.tarrant', json });
    expect(refused.status).toBe(status);
    expect(await told(refused)).toMatchObject({ code, errors: [{ path }] });
  });

  it('refuses what cannot be read', async () => {
    expect((await ask(db, raise, { who: 'owen.tarrant', text: '{"class":' })).status).toBe(400);
    const plain = { who: 'owen.tarrant', text: 'hello', headers: { 'Content-Type': 'text/plain' } };
    expect((await ask(db, raise, plain)).status).toBe(415);
  });

  it('gives the same case again for the same key, and refuses the key for another body', async () => {
    const headers = { 'Idempotency-Key': 'raise-once-0001' };
    const first = await ask(db, raise, { who: 'owen.tarrant', json: NEW, headers });
    expect(first.status).toBe(201);
    const made = await told(first);
    const again = await ask(db, raise, { who: 'owen.tarrant', json: NEW, headers });
    expect(await told(again)).toEqual(made);
    const other = await ask(db, raise, { who: 'owen.tarrant', json: { ...NEW, title: 'Other' }, headers });
    expect(await told(other)).toMatchObject({ code: 'KEY_REUSED', status: 422 });
  });

  it('takes a form and says where to go on', async () => {
    const form = [
      ['title', 'New trim of LV-304'],
      ['system', 'SYS-302'],
      ['class', 'correction'],
      ['whatChanges', 'The trim was recorded wrongly.'],
      ['_key', 'raise-form-0001'],
    ] as const;
    const { next } = await told(await ask(db, raise, { who: 'owen.tarrant', form }));
    expect(next).toMatch(/^\/s\/ketterwold\/cases\/KW-2026-\d{3}$/);
    const made = await row(String(next).split('/').at(-1) ?? '');
    expect(JSON.stringify(made?.brief.whatChanges)).toContain('recorded wrongly');
  });
});

describe('reading cases', () => {
  it('lists by stage and by seat', async () => {
    const asOwen = await told(await ask(db, list, { who: 'owen.tarrant' }));
    expect((asOwen['lines'] as unknown[]).length).toBeGreaterThanOrEqual(10);
  });
  it('tells acts with reasons, open points and a version', async () => {
    const at = { who: 'owen.tarrant', params: DRAFT };
    expect((await ask(db, show, at)).headers.get('etag')).toBe('"case-1"');
    const points = await told(await ask(db, openPoints, at));
    expect(points).toMatchObject({ gate: 'draft' });
    const { acts } = (await told(await ask(db, canDo, at))) as {
      acts: { act: string; ok: boolean; sentence?: string }[];
    };
    const sign = acts.find((one) => one.act === 'SIGN');
    expect(sign?.ok).toBe(false);
    expect(sign?.sentence).toBeTruthy();
    expect((await ask(db, show, { who: 'owen.tarrant', params: { number: 'KW-1999-001' } })).status).toBe(
      404,
    );
  });
});

describe('the brief', () => {
  const patch = { method: 'PATCH', params: DRAFT };
  it('is edited by its originator alone, whatever the body', async () => {
    const refused = await ask(db, brief, { ...patch, who: 'hedda.brannick', json: { nonsense: 1 } });
    expect(refused.status).toBe(403);
  });
  it('asks for the version, and refuses a stale one with what stands now', async () => {
    const json = { timeNeeded: 'two shifts' };
    expect((await ask(db, brief, { ...patch, who: 'owen.tarrant', json })).status).toBe(428);
    const headers = { 'If-Match': '"case-77"' };
    const stale = await ask(db, brief, { ...patch, who: 'owen.tarrant', json, headers });
    expect(stale.status).toBe(412);
    const problem = (await told(stale)) as { present: { version: number; brief: { timeNeeded: string } } };
    expect(problem.present.version).toBe(1);
    expect(problem.present.brief.timeNeeded).toBe('6 weeks after approval');
    expect((await row('KW-2026-016'))?.brief.timeNeeded).toBe('6 weeks after approval');
  });
  it('refuses oversize text and unknown fields, and writes nothing', async () => {
    const headers = { 'If-Match': '"case-1"' };
    for (const json of [{ effect: 'x'.repeat(150_000) }, { unheard: 'of' }]) {
      const refused = await ask(db, brief, { ...patch, who: 'owen.tarrant', json, headers });
      expect(refused.status).toBe(422);
    }
    expect((await row('KW-2026-016'))?.version).toBe(1);
  });
  it('takes a form: plain words, the editor’s own text, papers with blank rows', async () => {
    const editors =
      '{"type":"doc","content":[{"type":"paragraph","content":[{"type":"text","text":"Bold","marks":[{"type":"bold"}]}]}]}';
    const form = [
      ['fields', 'technicalBasis effect papers'],
      ['technicalBasis', editors],
      ['effect', 'Nobody comes nearer to acetone.\nThe hose is earthed.'],
      ['papers.0.kind', 'drawing'],
      ['papers.0.reference', '500-P-003'],
      ['papers.0.when', 'after'],
      ['papers.0.state', 'drafted'],
      ['papers.1.kind', ''],
      ['papers.1.reference', ''],
      ['papers.1.when', 'before-start-up'],
      ['papers.1.state', 'not-started'],
      ['_version', '1'],
    ] as const;
    const saved = await ask(db, brief, { ...patch, who: 'owen.tarrant', form });
    expect(saved.status).toBe(200);
    const now = await row('KW-2026-016');
    expect(now?.version).toBe(2);
    expect(now?.brief.papers).toMatchObject([
      { kind: 'drawing', reference: '500-P-003', from: '', when: 'after' },
    ]);
    expect(now?.brief.effect.content).toHaveLength(2);
    expect(JSON.stringify(now?.brief.technicalBasis)).toContain('"marks":[{"type":"bold"}]');
  });
});

describe('people and affected systems', () => {
  it('refuses a checker who is the originator, beside the field', async () => {
    const form = [
      ['seats.checker', await personId('Owen Tarrant')],
      ['_version', '2'],
      ['_key', 'seats-0000001'],
    ] as const;
    const refused = await ask(db, seats, { who: 'owen.tarrant', params: DRAFT, form });
    expect(await told(refused)).toMatchObject({
      code: 'NOT_INDEPENDENT',
      status: 403,
      errors: expect.arrayContaining([expect.objectContaining({ path: 'seats/checker' })]) as unknown,
    });
  });
  it('nominates several approvers by a form', async () => {
    const form = [
      ['seats.approver[]', await personId('Grace Okonta')],
      ['seats.approver[]', await personId('Rufus Hallam')],
      ['_version', '2'],
      ['_key', 'seats-0000002'],
    ] as const;
    expect((await ask(db, seats, { who: 'owen.tarrant', params: DRAFT, form })).status).toBe(200);
    const view = (await told(await ask(db, show, { who: 'owen.tarrant', params: DRAFT }))) as {
      seats: { role: string; name: string }[];
    };
    const approvers = view.seats.filter((one) => one.role === 'approver').map((one) => one.name);
    expect(approvers.sort()).toEqual(['Grace Okonta', 'Rufus Hallam']);
  });
  it('asks why a system is not affected', async () => {
    const json = { document: 'nobody', answer: 'not-affected' };
    const headers = { 'If-Match': '"case-3"' };
    const refused = await ask(db, affected, { who: 'owen.tarrant', params: DRAFT, json, headers });
    expect(await told(refused)).toMatchObject({ code: 'SCHEMA', errors: [{ path: 'reason' }] });
  });
});

describe('copying', () => {
  it('takes a refused case to a new draft, and no other', async () => {
    const wrong = await ask(db, copy, { who: 'owen.tarrant', params: DRAFT, json: {} });
    expect(await told(wrong)).toMatchObject({ code: 'WRONG_STAGE', status: 409 });
    const made = await ask(db, copy, { who: 'owen.tarrant', params: { number: 'KW-2025-041' }, json: {} });
    expect(made.status).toBe(201);
    const { number } = (await told(made)) as { number: string };
    expect(await row(number)).toMatchObject({ stage: 'draft' });
  });
});
