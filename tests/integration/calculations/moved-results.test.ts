/* What moved since it was stored: against bound evaluations and against the registers, by owner, for those who oversee. */
import { beforeAll, describe, expect, it } from 'vitest';
import { keepEvaluation } from '@data/evaluations';
import { findDocumentByTag } from '@data/documents';
import { revisionInForce } from '@data/revisions';
import { rulesOf } from '@services/case-file';
import { evaluateRevision } from '@services/evaluate-document';
import { movedView, workMoved } from '@services/moved-results';
import { type Q } from '@engine/quantity';
import { type Demo, demoSite } from '../views/demo';

let demo: Demo;
let siteId: string;

beforeAll(async () => {
  demo = await demoSite();
  siteId = (await demo.actor('aoife.renshaw')).site.id;
}, 120_000);

/** The revision in force of a system with its evaluation as this engine works it. */
async function inForce(tag: string) {
  const document = (await findDocumentByTag(demo.db, siteId, 'system', tag))!;
  const revision = (await revisionInForce(demo.db, document.id))!;
  const { rules } = await rulesOf(demo.db, siteId);
  const evaluated = (await evaluateRevision(demo.db, revision, rules))!;
  return { document, revision, evaluated };
}

describe('results stored by this very engine', () => {
  it('have not moved, and every revision in force was worked again', async () => {
    const view = await workMoved(demo.ctx, { id: siteId });
    expect(view.revisions).toEqual([]);
    expect(view.worked).toBeGreaterThan(5);
  });
});

describe('results stored by another engine', () => {
  it('are listed with the change, registers and bound evaluations alike, by owner', async () => {
    const registers = await inForce('SYS-103');
    const where = { document_id: registers.document.id, truth: 'in-force' };
    const row = await demo
      .db('p_scenarios')
      .where(where)
      .whereNotNull('load_si')
      .first('element_id', 'load_si');
    await demo
      .db('p_scenarios')
      .where({ ...where, element_id: row.element_id })
      .update({ load_si: row.load_si / 1.02, verdict: 'inadequate' });

    const bound = await inForce('SYS-101');
    const { evaluation } = bound.evaluated;
    const [path] = Object.entries(evaluation.figures).find(
      ([name, value]) => name.endsWith('#A_required') && typeof value === 'object',
    )!;
    const stored = evaluation.figures[path] as Q;
    const hashes = { documentHash: 'd', importsHash: 'i', judgementHash: 'j', catalogHash: 'c' };
    const figures = { ...evaluation.figures, [path]: { ...stored, value: stored.value / 0.99 } };
    const key = bound.revision.evaluationKey!;
    await keepEvaluation(
      demo.db,
      { key, ...hashes, engine: 'engine-0', figures, outcomes: [], at: '2026-01-01T00:00:00.000Z' },
      ['a.gas@0'],
    );

    const { revisions } = await workMoved(demo.ctx, { id: siteId });
    expect(revisions.map((one) => [one.tag, one.stored]).sort()).toEqual([
      ['SYS-101', 'evaluation'],
      ['SYS-103', 'registers'],
    ]);
    const lines = Object.fromEntries(revisions.map((one) => [one.tag, one.lines]));
    expect(lines['SYS-101']).toEqual([
      expect.objectContaining({
        shift: '\u22121.00 %',
        verdict: false,
        what: expect.stringMatching(/A required$/) as string,
      }),
    ]);
    expect(lines['SYS-103']).toContainEqual(
      expect.objectContaining({ shift: '+2.00 %', what: expect.stringMatching(/relief load$/) as string }),
    );
    expect(lines['SYS-103']).toContainEqual(expect.objectContaining({ old: 'inadequate', verdict: true }));
    const owners = revisions.map((one) => one.owner);
    expect(owners).toEqual(owners.toSorted((a, b) => a.localeCompare(b)));
  });

  it('are for coordinators and auditors, and nobody else', async () => {
    expect(await movedView(demo.ctx, await demo.actor('aoife.renshaw'))).toMatchObject({
      ok: true,
      value: { revisions: [{}, {}] },
    });
    expect(await movedView(demo.ctx, await demo.actor('owen.tarrant'))).toMatchObject({
      ok: false,
      problem: { code: 'NOT_PERMITTED' },
    });
  });

  it('leave out what moved by less than the share of the site', async () => {
    await demo
      .db('p_scenarios')
      .whereNotNull('load_si')
      .update({ load_si: demo.db.raw('load_si * 1.004') });
    const { revisions } = await workMoved(demo.ctx, { id: siteId });
    const shifts = revisions.flatMap((one) => one.lines.map((line) => line.shift)).filter(Boolean);
    expect(shifts.every((shift) => Math.abs(Number.parseFloat(shift.replace('\u2212', '-'))) > 0.5)).toBe(
      true,
    );
  });
});
