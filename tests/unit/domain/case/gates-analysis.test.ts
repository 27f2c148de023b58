/* Gates of the draft and of the scenario analysis: each open point stands while its condition holds and goes when it is mended. */
import { describe, expect, it } from 'vitest';
import { openPoints } from '@domain/case';
import { aCase, basis, codes, documentFacts, evaluation, facts, outcome, says } from './fixture';

const brief = aCase().brief;

describe('the gate of the draft', () => {
  it('is open when all is said', () => expect(codes('draft', {})).toEqual([]));
  it.each([
    ['whatChanges', { whatChanges: says(' ') }],
    ['technicalBasis', { technicalBasis: says('') }],
    ['effect', { effect: { type: 'doc' as const, content: [] } }],
    ['timeNeeded', { timeNeeded: ' ' }],
    ['papers', { papers: [] }],
  ])('asks for %s', (_name, part) =>
    expect(codes('draft', { case: aCase({ brief: { ...brief, ...part } }) })).toEqual([
      'change-not-described',
    ]),
  );
  it('asks for the systems', () =>
    expect(codes('draft', { case: aCase({ documents: [] }) })).toEqual(['change-not-described']));
  it('asks for each seat, and of a graded first issue only two', () => {
    expect(codes('draft', { case: aCase({ seats: [] }) })).toEqual([
      'seat-empty',
      'seat-empty',
      'seat-empty',
      'seat-empty',
    ]);
    const graded = {
      case: aCase({ class: 'first-issue', seats: [] }),
      documents: [documentFacts({ doc: basis({ grade: 'copied-in' }) })],
    };
    expect(codes('draft', graded)).toEqual(['seat-empty', 'seat-empty']);
  });
  it('refuses people who are not independent', () => {
    const seats = aCase().seats.map((seat) => (seat.role === 'checker' ? { ...seat, person: 'ann' } : seat));
    const open = openPoints(
      'draft',
      facts({ case: aCase({ seats }), roles: { ...facts().roles, ann: ['originator', 'checker'] } }),
    );
    expect(open).toEqual([
      expect.objectContaining({
        code: 'people-not-independent',
        sentence: 'Ann cannot be checker: they already are originator in this case.',
      }),
    ]);
  });
  it('asks of each affected system, for a reason, and again after 90 days', () => {
    const affected = (over: object) => ({
      case: aCase({ affected: [{ document: 'doc9', why: ['shares P-1'], hash: 'h', ...over }] }),
    });
    const reason = 'The pump P-1 has its own valve, and SYS-9 stays below it at shut-off.';
    expect(codes('draft', affected({}))).toEqual(['affected-unreviewed']);
    expect(codes('draft', affected({ answer: 'not-affected', reason: 'no', at: '2026-03-19' }))).toEqual([
      'affected-unreviewed',
    ]);
    expect(codes('draft', affected({ answer: 'not-affected', reason, at: '2026-03-19' }))).toEqual([]);
    expect(codes('draft', affected({ answer: 'included', at: '2025-12-20' }))).toEqual([]);
    expect(codes('draft', affected({ answer: 'included', at: '2025-12-19' }))).toEqual([
      'affected-unreviewed',
    ]);
  });
  it('holds a temporary change to its limit', () => {
    const whole = {
      ...brief,
      starts: '2026-04-01',
      ends: '2026-06-30',
      removal: says('a'),
      safeguards: says('b'),
      owner: 'ann',
    };
    const of = (over: object) => ({ case: aCase({ class: 'temporary', brief: { ...whole, ...over } }) });
    expect(codes('draft', of({}))).toEqual([]);
    expect(codes('draft', of({ ends: '2026-07-01' }))).toEqual(['temporary-limit']);
    expect(codes('draft', of({ ends: '2026-03-01' }))).toEqual(['temporary-limit']);
    expect(
      codes('draft', of({ ends: undefined, removal: undefined, safeguards: undefined, owner: undefined })),
    ).toHaveLength(4);
  });
  it('asks an emergency that cuts protection for a substitute', () => {
    const of = (substitute: string) => ({
      case: aCase({ class: 'emergency', brief: { ...brief, substitute: says(substitute) } }),
      documents: [documentFacts({ protectionCut: 'PSV-1 is out' })],
    });
    expect(codes('draft', of(''))).toEqual(['emergency-protection-cut']);
    expect(codes('draft', of('PSV-2 stands in'))).toEqual([]);
  });
});

describe('the gate of the scenario analysis', () => {
  const at = (over: Parameters<typeof documentFacts>[0]) =>
    codes('scenarios', { documents: [documentFacts(over)] });
  const without = (id: string, change: Record<string, unknown>) =>
    basis({ scenarios: basis().scenarios.map((each) => (each.id === id ? { ...each, ...change } : each)) });
  it('is open when all is decided and sized', () => expect(at({})).toEqual([]));
  it('asks for a decision and a reason, unless the basis in force had none either', () => {
    const undecided = without('tube-rupture', { disposition: undefined });
    expect(at({ doc: undecided })).toEqual(['scenario-undecided']);
    expect(at({ doc: undecided, baseDoc: undecided })).toEqual([]);
    expect(at({ doc: without('tube-rupture', { reason: says('') }) })).toEqual(['scenario-reason-thin']);
  });
  it('says a thing once when the rulebook says it too', () => {
    const said = outcome({
      code: 'scenario-undecided',
      subject: 'scenarios/tube-rupture',
      sentence: 'Tube rupture has no decision.',
    });
    expect(at({ doc: without('tube-rupture', { disposition: undefined }), outcomes: [said] })).toEqual([
      'scenario-undecided',
    ]);
  });
  it('asks a credible scenario for a sheet, a result and a group', () => {
    expect(at({ doc: without('fire-wetted', { answers: [] }) })).toEqual(['sheet-incomplete']);
    const refused = evaluation();
    const key = 'size:fire-wetted/a2';
    refused.sheets[key] = {
      ...(refused.sheets[key] as (typeof refused.sheets)[string]),
      refused: { code: 'X', text: 'No latent heat.', field: 'x' },
    };
    expect(at({ evaluation: refused })).toEqual(['sheet-incomplete']);
    const { group: _group, ...loose } = basis().scenarios[1]?.answers[0] ?? { group: '' };
    expect(at({ doc: without('fire-wetted', { answers: [loose] }) })).toEqual(['group-missing']);
  });
  it('stops at stop, at justify until it is justified, never at a note or at what is inherited', () => {
    const justify = outcome({ severity: 'justify', hash: 'a'.repeat(64) });
    const text = says('The loss was measured, the valve has not chattered in ten years.');
    const written = (hash: string) =>
      basis({
        justifications: [
          {
            id: 'j',
            code: 'set-above-mawp',
            subject: 'reliefPoints/p1/set',
            values: {},
            hash,
            text,
            by: 'ann',
            on: '2026-03-01',
          },
        ],
      });
    expect(at({ outcomes: [outcome()] })).toEqual(['set-above-mawp']);
    expect(at({ outcomes: [justify] })).toEqual(['set-above-mawp']);
    expect(at({ outcomes: [justify], doc: written('a'.repeat(64)) })).toEqual([]);
    expect(at({ outcomes: [justify], doc: written('b'.repeat(64)) })).toEqual(['set-above-mawp']);
    expect(
      at({
        outcomes: [
          outcome({ severity: 'note' }),
          outcome({ inherited: true }),
          outcome({ code: 'only-at-approval' }),
        ],
      }),
    ).toEqual([]);
  });
  it('stops at stale figures, undecided conflicts, and a correction that moves something', () => {
    expect(at({ stale: [{ path: 'scenarios/fire-wetted/reason', sentence: 'stale' }] })).toEqual([
      'figure-stale',
    ]);
    expect(at({ conflicts: 2 })).toEqual(['merge-unfinished']);
    const moved = [documentFacts({ moved: [{ path: 'reliefPoints/p1/set', sentence: 'moves' }] })];
    expect(codes('scenarios', { documents: moved, case: aCase({ class: 'correction' }) })).toEqual([
      'correction-moves-result',
    ]);
    expect(codes('scenarios', { documents: moved })).toEqual([]);
  });
  it('leads to the place, and tells no figure when the view is hidden', () => {
    const [open] = openPoints(
      'scenarios',
      facts({ documents: [documentFacts({ outcomes: [outcome()] })], hidden: true }),
    );
    expect(open?.where).toBe('cases/KW-2026-003/changes#reliefPoints%2Fp1%2Fset');
    expect(open?.sentence).not.toMatch(/\d+ barg/);
  });
});
