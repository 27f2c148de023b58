/* The field sheet by its services: seen before shown, compared, told once; put right and seen again; sent back; who may not. */
import { beforeAll, describe, expect, test } from 'vitest';
import { fieldLines } from '@domain/field';
import { basisOf, findRevision } from '@data/revisions';
import { fixDiscrepancy, seeAgain, sendBack } from '@services/field/discrepancies';
import { type EntryBody, entriesSchema } from '@services/field/bodies';
import { enterField } from '@services/field/enter';
import { fieldView } from '@services/views/case/field';
import { act, codeOf, fileOf, plant, type Plant, pointsAt, sent, value } from '../stage/plant';
import { impeller, inField, seen, startUpDone, TEAM } from '../stage/hands';

let site: Plant;
let number: string;
let line: string;
beforeAll(async () => {
  site = await plant();
  number = await inField(site, TEAM, impeller(204));
  line = (await fileOf(site, number)).lines[0]?.key ?? '';
}, 120_000);

let count = 0;
const entry = (seenThere: EntryBody['seen'], more: Partial<EntryBody> = {}): EntryBody => ({
  client: `client-${String((count += 1))}`,
  line,
  as: 'verifier',
  seen: seenThere,
  files: [],
  device: 'test',
  ...more,
});
const mm = (figure: number) => ({ value: figure, unit: 'mm' });
const enter = (by: string, ...entries: EntryBody[]) =>
  enterField(site.ctx, site.who(by), number, sent({ entries }));
const lineFor = async (by: string) =>
  value(await fieldView(site.ctx, site.who(by), number)).blocks[0]?.lines[0];
const notices = async (): Promise<number> =>
  (await site.db('notices').where({ event: 'case.discrepancy-found' })).length;

describe('seen before shown', () => {
  test('what was signed is not in the view of one who is to see it, in no form', async () => {
    const view = value(await fieldView(site.ctx, site.who('Tomas'), number));
    expect(JSON.stringify(view)).not.toMatch(/\b204\b/);
    expect(view.blocks[0]?.lines[0]).toMatchObject({
      state: 'to-see',
      ask: { kind: 'quantity', unit: 'mm' },
    });
  });

  test('a photograph that is not one, a word for a figure and a stranger as second person are refused', async () => {
    expect(codeOf(await enter('Tomas', entry('big')))).toBe('SCHEMA');
    const second = { why: 'reach' as const, means: 'borescope', second: 'per_nobody' };
    expect(codeOf(await enter('Tomas', entry(undefined, { cannot: second })))).toBe('SCHEMA');
    const alone = { ...second, second: site.who('Tomas').person.id };
    expect(codeOf(await enter('Tomas', entry(undefined, { cannot: alone })))).toBe('SCHEMA');
    expect(codeOf(await enter('Tomas', entry(mm(204), { files: ['file_nowhere'] })))).toBe('SCHEMA');
    expect((await fileOf(site, number)).entries).toEqual([]);
  });

  test('nobody verifies what they installed, nor their own case', async () => {
    const own = { installer: site.who('Tomas').person.id };
    expect(codeOf(await enter('Tomas', entry(mm(204), own)))).toBe('NOT_INDEPENDENT');
    value(await enter('Signe', entry(mm(204), { as: 'installer' })));
    expect(codeOf(await enter('Signe', entry(mm(204))))).toBe('NOT_INDEPENDENT');
    expect(codeOf(await enter('Owen', entry(mm(204))))).toBe('NOT_PERMITTED');
    expect((await pointsAt(site, number, 'field')).join()).toContain('not seen yet');
  });
});

describe('a discrepancy', () => {
  test('is made by an entry that differs, told once, and holds the confirmation', async () => {
    const wrong = entry(mm(212));
    const first = value(await enter('Tomas', wrong));
    expect(first.entries[0]).toMatchObject({ state: 'accepted', agrees: false, discrepancy: 1 });
    expect(first.entries[0]?.wants).toMatchObject({ value: 204, unit: 'mm' });
    const told = await notices();
    expect(told).toBeGreaterThan(2);
    const again = value(await enter('Tomas', wrong));
    expect(again.entries[0]).toMatchObject({ state: 'accepted', agrees: false });
    expect((await fileOf(site, number)).discrepancies).toHaveLength(1);
    expect(await notices()).toBe(told);
    await startUpDone(site, number);
    const held = await act(site, number, 'ISSUE', 'Tomas', { document: 'SYS-101' });
    expect(codeOf(held)).toBe('GATE_SHUT');
    expect(held.ok ? '' : held.problem.openPoints?.map((point) => point.code).join()).toContain(
      'discrepancy-open',
    );
  });

  test('under the same client id with other content is a conflict, and on a line not settled too', async () => {
    const other = value(await enter('Tomas', entry(mm(204), { client: 'client-8' })));
    const fresh = value(await enter('Tomas', entry(mm(204))));
    expect(fresh.entries[0]?.state).toBe('conflict');
    expect(other.entries[0]?.state).toBe('conflict');
    expect(fresh.entries[0]?.wants).toBeUndefined();
  });

  test('shows both sides to scale to who has seen the line', async () => {
    const shown = await lineFor('Tomas');
    expect(shown).toMatchObject({
      state: 'differs',
      seen: { text: '212' },
      wants: { text: '204' },
      discrepancy: 1,
    });
    expect(shown?.gap).toMatchObject({ seen: 212, signed: 204 });
    expect(shown?.gap?.tolerance).toBeCloseTo(204 * 0.005, 6);
  });

  test('put right must be seen again; seen otherwise it is open anew; seen as signed it is settled', async () => {
    const at = { number, discrepancy: 1 };
    const see = (figure: number) =>
      seeAgain(site.ctx, site.who('Tomas'), at, sent({ entry: entry(mm(figure)) }));
    expect(codeOf(await see(204))).toBe('WRONG_STAGE');
    const fix = () => fixDiscrepancy(site.ctx, site.who('Tomas'), at, sent({ text: 'Impeller changed.' }));
    expect(value(await fix()).state).toBe('fixed');
    expect(codeOf(await fix())).toBe('WRONG_STAGE');
    expect(value(await see(212)).state).toBe('open');
    value(await fix());
    expect(value(await see(204)).state).toBe('seen-again');
    expect((await pointsAt(site, number, 'field')).join()).not.toContain('discrepancy');
    expect(codeOf(await fixDiscrepancy(site.ctx, site.who('Signe'), at, sent({ text: 'x' })))).toBe(
      'NOT_INDEPENDENT',
    );
    expect(
      codeOf(
        await fixDiscrepancy(site.ctx, site.who('Tomas'), { number, discrepancy: 9 }, sent({ text: 'x' })),
      ),
    ).toBe('UNKNOWN');
  });

  test('leaves only the photograph to be asked for', async () => {
    const open = await pointsAt(site, number, 'field');
    expect(open).toEqual([expect.stringContaining('a photograph is asked for')]);
    await seen(site, number);
    expect(value(await act(site, number, 'ISSUE', 'Tomas', { document: 'SYS-101' })).stage).toBe('in-force');
  });
});

describe('sent back', () => {
  test('a discrepancy becomes a must-fix finding and holds until the case says what is there', async () => {
    number = await inField(site, TEAM, impeller(225));
    line = (await fileOf(site, number)).lines[0]?.key ?? '';
    value(await enter('Tomas', entry(mm(190))));
    const at = { number, discrepancy: 1 };
    expect(codeOf(await sendBack(site.ctx, site.who('Signe'), at, sent({ text: 'x' })))).toBe(
      'NOT_PERMITTED',
    );
    value(await sendBack(site.ctx, site.who('Tomas'), at, sent({ text: 'The maker delivered 190 mm.' })));
    const file = await fileOf(site, number);
    expect(file.findings[0]).toMatchObject({ weight: 'must-fix', state: 'open', place: line });
    expect(file.discrepancies[0]).toMatchObject({ state: 'sent-back', findingId: file.findings[0]?.id });
    expect((await pointsAt(site, number, 'field')).join()).toContain('Discrepancy 1');
  });
});

test('the rows of a form that were left empty are no entries, and what was typed is read with its unit', () => {
  const row = { client: 'a', line: 'b', as: 'verifier', blank: 'may' };
  const typed = { ...row, client: 'c', seen: { typed: '5,10', unit: 'bar_g' } };
  const parsed = entriesSchema.parse({ entries: [{ ...row, seen: { unit: 'bar_g' } }, typed] });
  expect(parsed.entries).toHaveLength(1);
  expect(parsed.entries[0]?.seen).toMatchObject({ value: 5.1, unit: 'bar_g' });
  const bad = entriesSchema.safeParse({ entries: [{ ...row, seen: { typed: 'five', unit: 'bar_g' } }] });
  expect(bad.success).toBe(false);
});

test('field lines of the seeded sheet are those of its signed revision', async () => {
  const file = await fileOf(site, 'KW-2025-036');
  const working = file.documents[0]?.working;
  const revision = await findRevision(site.db, working?.id ?? '');
  const body = await basisOf(site.db, working?.id ?? '');
  const base = await basisOf(site.db, revision?.baseId ?? '');
  expect(body && fieldLines(body, base).map((one) => one.key)).toEqual(file.lines.map((one) => one.key));
});
