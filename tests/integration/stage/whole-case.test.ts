/* One case from the idea to the revision in force, by the services alone, on the invented site. */
import { beforeAll, describe, expect, test } from 'vitest';
import { findDocumentByTag } from '@data/documents';
import { basisOf, findRevision } from '@data/revisions';
import { verifyTrail } from '@data/trail';
import { act, codeOf, fileOf, plant, type Plant, pointsAt, value } from './plant';
import {
  agreed,
  answered,
  atApproval,
  changed,
  checkedUnseen,
  deficiencies,
  impeller,
  LARGER_IMPELLER,
  raised,
  seen,
  startUpDone,
  TEAM,
} from './hands';

let site: Plant;
beforeAll(async () => {
  site = await plant();
}, 120_000);

async function inForceNumber(tag: string): Promise<number> {
  const document = await findDocumentByTag(site.db, site.site.id, 'system', tag);
  const revision = await findRevision(site.db, document?.inForceId ?? '');
  return revision?.number ?? 0;
}

const rowOf = async (tag: string): Promise<Record<string, unknown>> =>
  (await site.db('p_systems').where({ tag, truth: 'in-force' }).first()) as Record<string, unknown>;

describe('a permanent change, whole', () => {
  let number: string;
  let before: number;

  test('the draft asks for what is missing, then passes', async () => {
    before = await inForceNumber('SYS-101');
    number = await raised(site, ['SYS-101']);
    const open = await pointsAt(site, number, 'draft');
    expect(open.filter((point) => point.startsWith('affected-unreviewed')).length).toBeGreaterThan(2);
    const shut = await act(site, number, 'PASS-draft', 'Owen');
    expect(codeOf(shut)).toBe('GATE_SHUT');
    expect(shut.ok ? [] : shut.problem.openPoints?.length).toBe(open.length);
    await answered(site, number);
    expect(value(await act(site, number, 'PASS-draft', 'Owen')).stage).toBe('scenarios');
    expect((await fileOf(site, number)).documents[0]?.working?.state).toBe('working');
  });

  test('the originator changes figures and passes; the checker works unseen, agrees and passes', async () => {
    await changed(site, number, 'SYS-101', LARGER_IMPELLER);
    expect(value(await act(site, number, 'PASS-scenarios', 'Owen')).stage).toBe('check');
    expect((await pointsAt(site, number, 'check')).join()).toContain('unseen');
    await checkedUnseen(site, number);
    expect((await pointsAt(site, number, 'check')).every((one) => one.startsWith('sheet-not-agreed'))).toBe(
      true,
    );
    await agreed(site, number);
    expect(value(await act(site, number, 'PASS-check', 'Ilse')).stage).toBe('approval');
  });

  test('the approver signs: the revision is approved, field lines and start-up items are made', async () => {
    expect(value(await act(site, number, 'SIGN', 'Grace')).stage).toBe('field');
    const file = await fileOf(site, number);
    expect(file.documents[0]?.working?.state).toBe('approved');
    expect(file.lines.map((line) => line.label)).toEqual(['P-101: impeller diameter']);
    expect(file.due.map((item) => item.kind).sort()).toEqual(['paper', 'pssr', 'training']);
    expect(await inForceNumber('SYS-101')).toBe(before);
  });

  test('operations see the field; the gate is shut until start-up items are done', async () => {
    await seen(site, number);
    expect(
      (await pointsAt(site, number, 'field')).every((one) => one.startsWith('start-up-action-open')),
    ).toBe(true);
    expect(codeOf(await act(site, number, 'ISSUE', 'Tomas', { document: 'SYS-101' }))).toBe('GATE_SHUT');
    await startUpDone(site, number);
    expect(await pointsAt(site, number, 'field')).toEqual([]);
  });

  test('confirming puts revision N+1 in force, and the register shows it', async () => {
    const old = await rowOf('SYS-101');
    const done = value(await act(site, number, 'ISSUE', 'Tomas', { document: 'SYS-101' }));
    expect(done.stage).toBe('in-force');
    expect(await inForceNumber('SYS-101')).toBe(before + 1);
    const document = await findDocumentByTag(site.db, site.site.id, 'system', 'SYS-101');
    const body = await basisOf(site.db, document?.inForceId ?? '');
    const pump = body?.sources.find((source) => source.id === 'src_p101');
    expect(pump?.pump?.impeller).toMatchObject({ value: 219, unit: 'mm' });
    const row = await rowOf('SYS-101');
    expect(row['revision']).toBe(before + 1);
    expect(old['revision']).toBe(before);
    expect(Number(row['use'])).toBeGreaterThan(Number(old['use']));
    const papers = (await fileOf(site, number)).due.filter((item) => item.text.includes('OP-101'));
    expect(papers.map((item) => item.state)).toEqual(['open']);
  });

  test('signatures stand after the issue, and the chain of the trail is whole', async () => {
    const file = await fileOf(site, number);
    expect(file.signatures.map((one) => one.gate)).toEqual([
      'draft',
      'scenarios',
      'check',
      'approval',
      'field',
    ]);
    expect(file.signatures.every((one) => one.voids.length === 0)).toBe(true);
    expect((await verifyTrail(site.db, site.site.id)).ok).toBe(true);
  });
});

test('what failed before passes only as signed deficiencies', async () => {
  const number = await raised(site, ['SYS-104']);
  await answered(site, number);
  value(await act(site, number, 'PASS-draft', 'Owen'));
  await changed(site, number, 'SYS-104', [
    {
      op: 'set',
      path: 'reliefPoints/rp_psv116/model',
      value: 'A-200',
    },
  ]);
  value(await act(site, number, 'PASS-scenarios', 'Owen'));
  await checkedUnseen(site, number);
  await agreed(site, number);
  value(await act(site, number, 'PASS-check', 'Ilse'));
  const bare = await act(site, number, 'SIGN', 'Grace');
  expect(codeOf(bare)).toBe('GATE_SHUT');
  const open = bare.ok ? [] : (bare.problem.openPoints ?? []);
  expect([...new Set(open.map((point) => point.code))]).toEqual(['deficiency-unowned']);
  const taken = await deficiencies(site, number);
  expect(taken).toHaveLength(open.length);
  expect(value(await act(site, number, 'SIGN', 'Grace', { deficiencies: taken })).stage).toBe('field');
  const file = await fileOf(site, number);
  const signed = file.due.filter((item) => item.kind === 'deficiency');
  expect(signed).toHaveLength(open.length);
  expect(signed.every((item) => item.signatureId !== null)).toBe(true);
  await seen(site, number);
  await startUpDone(site, number);
  expect(value(await act(site, number, 'ISSUE', 'Tomas', { document: 'SYS-104' })).stage).toBe('in-force');
});

test('two approvers: the first leaves it in approval, the second sends it to the field', async () => {
  const two = { ...TEAM, approvers: ['Grace', 'Rufus'] };
  const number = await atApproval(site, two, impeller(205));
  expect(value(await act(site, number, 'SIGN', 'Grace')).stage).toBe('approval');
  expect(await act(site, number, 'SIGN', 'Grace')).toMatchObject({
    ok: false,
    problem: { code: 'WRONG_STAGE', detail: expect.stringMatching(/^You have signed/) },
  });
  expect(value(await act(site, number, 'SIGN', 'Rufus')).stage).toBe('field');
  const file = await fileOf(site, number);
  expect(file.signatures.filter((one) => one.gate === 'approval')).toHaveLength(2);
  expect(file.row.stage).toBe('field');
  expect(file.due.filter((item) => item.kind === 'pssr')).toHaveLength(1);
});
