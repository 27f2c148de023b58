/* Every row of the stage table is reached, everything else is refused, and no stage is out of reach. */
import { describe, expect, it } from 'vitest';
import { STAGES, type Stage } from '@domain/case';
import {
  CASE_EFFECTS,
  CASE_EVENTS,
  caseSnapshot,
  initialSnapshot,
  nextCase,
  stageOf,
  type CaseContext,
} from '@workflows/case';
import { type Actor } from '@workflows/actor';
import {
  ACTORS,
  approver,
  context,
  event,
  one,
  operations,
  originator,
  outsideApprover,
  ROWS,
  temporary,
  two,
  type Row,
} from './stage-table';

const title = (row: Row): string => `${row.act} → ${row.to}`;

describe('the stage table', () => {
  it.each(ROWS.map((row) => [title(row), row] as const))('%s', (_title, row) => {
    for (const from of row.from) {
      const before = caseSnapshot(from, context(row.context));
      const after = nextCase(before, event(row.act, row.by, row.over));
      expect(after.can, `${row.act} at ${from}`).toBe(true);
      expect(stageOf(after.snapshot)).toBe(row.to === 'same' ? from : row.to);
      expect(after.effects).toEqual(row.effects);
      for (const broken of row.unless) {
        const bent = caseSnapshot(from, context(broken.context ?? row.context));
        const by = broken.by ?? row.by;
        const refused = nextCase(bent, event(row.act, by, broken.over ?? row.over));
        const other = ROWS.find(
          (each) => each !== row && each.act === row.act && each.from.includes(from) && each.by === by,
        );
        if (refused.can && other) {
          expect(stageOf(refused.snapshot), `${title(row)} bent`).not.toBe(row.to === 'same' ? '' : row.to);
        } else {
          expect(refused, `${title(row)} at ${from} unless ${JSON.stringify(broken)}`).toMatchObject({
            can: false,
            effects: [],
          });
          expect(stageOf(refused.snapshot)).toBe(from);
        }
      }
    }
  });

  it('refuses every act at every stage where the table has no row for it', () => {
    let refused = 0;
    for (const stage of STAGES)
      for (const act of CASE_EVENTS) {
        if (ROWS.some((row) => row.act === act && row.from.includes(stage))) continue;
        for (const actor of ACTORS)
          for (const kind of ['permanent', 'temporary', 'emergency', 'first-issue'] as const)
            for (const to of STAGES) {
              const at = caseSnapshot(
                stage,
                context({
                  class: kind,
                  ends: '2026-09-30',
                  heldFrom: 'draft',
                  graded: true,
                  documents: two('approved', 'issued'),
                }),
              );
              const result = nextCase(at, event(act, actor, { to }));
              expect(result.can, `${act} at ${stage}`).toBe(false);
              refused += 1;
            }
      }
    expect(refused).toBeGreaterThan(10_000);
  });

  it('never goes forward by RETURN or REOPEN, nor stays', () => {
    const order: Stage[] = ['draft', 'scenarios', 'check', 'approval', 'field', 'in-force'];
    for (const from of order)
      for (const to of STAGES)
        for (const actor of ACTORS)
          for (const act of ['RETURN', 'REOPEN'] as const) {
            const after = nextCase(caseSnapshot(from, context()), event(act, actor, { to }));
            if (after.can) expect(order.indexOf(stageOf(after.snapshot))).toBeLessThan(order.indexOf(from));
          }
  });

  it('has no stage out of reach, and no dead end but the final ones and what lasts', () => {
    const reached = new Set<Stage>(['draft']);
    for (let grown = true; grown;) {
      const size = reached.size;
      for (const row of ROWS)
        if (row.to !== 'same' && row.from.some((from) => reached.has(from))) reached.add(row.to);
      grown = reached.size > size;
    }
    expect([...reached].sort()).toEqual([...STAGES].sort());
    const left = STAGES.filter((stage) => !ROWS.some((row) => row.from.includes(stage)));
    expect(left.sort()).toEqual(['refused', 'removed', 'withdrawn']);
  });

  it('names only effects that are declared, and every declared one somewhere', () => {
    const named = new Set(ROWS.flatMap((row) => row.effects));
    expect([...named].sort()).toEqual([...CASE_EFFECTS].sort());
  });
});

describe('what the machine keeps', () => {
  it('approves, issues and reopens documents as the case moves', () => {
    const signed = nextCase(caseSnapshot('approval', context()), event('SIGN', approver)).snapshot;
    expect(signed.context.documents).toEqual(one('approved'));
    const returned = nextCase(signed, event('RETURN', operations, { to: 'scenarios' })).snapshot;
    expect(returned.context.documents).toEqual(one('open'));
    const issued = nextCase(signed, event('ISSUE', operations)).snapshot;
    expect(issued.context.documents).toEqual(one('issued'));
  });

  it('leaves an issued document alone when the rest is returned', () => {
    const mixed = caseSnapshot('field', context({ documents: two('issued', 'approved') }));
    const back = nextCase(mixed, event('RETURN', operations, { to: 'check' })).snapshot;
    expect(back.context.documents).toEqual(two('issued', 'open'));
  });

  it('takes the new end of an extension and counts it', () => {
    const before = caseSnapshot('in-force', context(temporary));
    const after = nextCase(before, event('EXTEND', outsideApprover)).snapshot;
    expect(after.context).toMatchObject({ ends: '2026-12-31', extensions: 1 });
  });

  it('refuses an approver who is also the originator or the checker', () => {
    for (const seat of ['originator', 'checker'] as const) {
      const both: Actor = { id: 'x', roles: ['approver', seat], seats: ['approver', seat] };
      expect(nextCase(caseSnapshot('approval', context()), event('SIGN', both)).can).toBe(false);
    }
  });

  it('survives being written down and read back', () => {
    const held = nextCase(initialSnapshot(context()), event('HOLD', originator)).snapshot;
    const kept = JSON.parse(JSON.stringify({ stage: stageOf(held), context: held.context })) as {
      stage: Stage;
      context: CaseContext;
    };
    const again = nextCase(caseSnapshot(kept.stage, kept.context), event('RESUME', originator));
    expect(again.can).toBe(true);
    expect(stageOf(again.snapshot)).toBe('draft');
  });
});
