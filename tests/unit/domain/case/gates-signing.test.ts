/* Gates of the approval and of the field: signatures that hold, deficiencies owned, everything seen. */
import { describe, expect, it } from 'vitest';
import { type GateFacts, openPoints } from '@domain/case';
import { fieldLines } from '@domain/field';
import { aCase, basis, codes, documentFacts, facts, outcome, says, signed } from './fixture';

const brief = aCase().brief;

describe('the gate of the approval', () => {
  const base: Partial<GateFacts> = { signatures: [signed('scenarios'), signed('check')] };
  const inherited = outcome({ inherited: true });
  const item = {
    id: 'd',
    kind: 'deficiency' as const,
    case: 'case1',
    document: 'doc1',
    text: 't',
    owner: 'tom',
    due: '2026-06-01',
    state: 'open' as const,
    interim: says('watched each shift'),
    outcome: inherited.hash,
    asked: { by: 'eva', at: '2026-03-01' },
  };
  it('is open when the check stands', () => expect(codes('approval', base)).toEqual([]));
  it('waits for signatures that hold and for as many approvers as the site asks', () => {
    expect(codes('approval', {})).toEqual(['signature-void']);
    expect(
      codes('approval', { signatures: [signed('scenarios'), signed('check', undefined, false)] }),
    ).toEqual(['signature-void']);
    expect(codes('approval', { ...base, rules: { ...facts().rules, approvers: 2 } })).toEqual([
      'approver-missing',
    ]);
  });
  it('wants what is inherited owned, with an interim measure and a near day', () => {
    const documents = [documentFacts({ outcomes: [inherited] })];
    expect(codes('approval', { ...base, documents })).toEqual(['deficiency-unowned']);
    expect(codes('approval', { ...base, documents, dueItems: [item] })).toEqual([]);
    expect(codes('approval', { ...base, documents, dueItems: [{ ...item, interim: undefined }] })).toEqual([
      'deficiency-unowned',
    ]);
    expect(codes('approval', { ...base, documents, dueItems: [{ ...item, due: '2026-09-01' }] })).toEqual([
      'deficiency-unowned',
    ]);
    expect(codes('approval', { ...base, documents, dueItems: [{ ...item, due: '2026-03-01' }] })).toEqual([
      'deficiency-unowned',
    ]);
  });
  it('asks an emergency for the confirmed word, and rules first asked at approval', () => {
    const authorised = {
      by: 'eva',
      how: 'spoken' as const,
      recordedBy: 'tom',
      at: '2026-03-19',
      words: 'go',
    };
    expect(codes('approval', { ...base, case: aCase({ class: 'emergency', authorised }) })).toEqual([
      'authorisation-unconfirmed',
    ]);
    expect(
      codes('approval', {
        ...base,
        documents: [documentFacts({ outcomes: [outcome({ code: 'only-at-approval' })] })],
      }),
    ).toEqual(['only-at-approval']);
  });
});

describe('the gate of the field', () => {
  const lines = fieldLines(
    basis({ reliefPoints: basis().reliefPoints.map((each) => ({ ...each, orifice: { letter: 'N' } })) }),
    basis(),
  );
  const entry = (line: (typeof lines)[number], over: object = {}) => ({
    id: `e:${line.key}`,
    case: 'case1',
    line: line.key,
    as: 'verifier' as const,
    seen: line.wants ?? 'KW1',
    files: ['f'],
    by: 'tom',
    saw: '2026-03-18T08:00:00.000Z',
    got: '2026-03-18T08:01:00.000Z',
    device: 'phone',
    ...over,
  });
  const field = { lines, entries: lines.map((line) => entry(line)), discrepancies: [] };
  const base: Partial<GateFacts> = {
    signatures: [signed('scenarios'), signed('check'), signed('approval')],
    field,
  };
  const at = (over: Partial<GateFacts>) => codes('field', { ...base, ...over }, 'doc1');
  const first = lines[0];
  if (!first) throw new Error('the field sheet is empty');
  it('is open when all is seen', () => expect(at({})).toEqual([]));
  it('asks for every line, a photograph, a second person, and another than the installer', () => {
    const rest = field.entries.slice(1);
    expect(at({ field: { ...field, entries: rest } })).toEqual(['field-line-missing']);
    const over = (change: object) => at({ field: { ...field, entries: [entry(first, change), ...rest] } });
    expect(over({ files: [] })).toEqual(['field-evidence-missing']);
    expect(
      over({ seen: undefined, cannot: { why: 'painted', means: 'certificate', second: 'tom' } }),
    ).toEqual(['field-evidence-missing']);
    expect(
      over({ seen: undefined, cannot: { why: 'painted', means: 'certificate', second: 'ivo' } }),
    ).toEqual([]);
    expect(over({ by: 'ann' })).toEqual(['field-verifier']);
    expect(over({ installer: 'tom' })).toEqual(['field-verifier']);
    expect(
      openPoints('field', facts({ ...base, field: { ...field, entries: [] } }), 'doc1').every(
        (each) => !/10\.|signed/.test(each.sentence),
      ),
    ).toBe(true);
  });
  it('is held by a discrepancy until it is seen again or accepted', () => {
    const held = (state: 'open' | 'fixed' | 'seen-again' | 'accepted') =>
      at({
        field: {
          ...field,
          discrepancies: [
            {
              id: 'x',
              number: 1,
              entry: `e:${first.key}`,
              holds: true,
              state,
              owner: 'tom',
              clears: 'See it again.',
              posts: [],
            },
          ],
        },
      });
    expect([held('open'), held('fixed'), held('seen-again'), held('accepted')]).toEqual([
      ['discrepancy-open'],
      ['discrepancy-open'],
      [],
      [],
    ]);
  });
  it('waits for start-up items, papers, a fresh approval and signed deficiencies', () => {
    const item = {
      id: 'd',
      kind: 'pssr' as const,
      case: 'case1',
      text: 'Walk-down',
      owner: 'tom',
      due: '2026-03-20',
      state: 'open' as const,
      asked: { by: 'eva', at: '2026-03-01' },
    };
    expect(at({ dueItems: [item] })).toEqual(['start-up-action-open']);
    expect(at({ dueItems: [{ ...item, state: 'done' }] })).toEqual([]);
    expect(at({ dueItems: [{ ...item, kind: 'approval-requirement' }] })).toEqual([]);
    expect(at({ dueItems: [{ ...item, kind: 'approval-requirement', bars: 'start-up' }] })).toEqual([
      'start-up-action-open',
    ]);
    const papers = [
      {
        id: 'n',
        kind: 'procedure',
        reference: 'OP-7',
        from: '3',
        to: '4',
        when: 'before-start-up' as const,
        state: 'drafted' as const,
      },
    ];
    // A paper holds start-up through its due item, which the approval makes: the brief itself is shut by then.
    expect(at({ case: aCase({ brief: { ...brief, papers } }) })).toEqual([]);
    const paper = { ...item, kind: 'paper' as const, bars: 'start-up' as const };
    expect(at({ case: aCase({ brief: { ...brief, papers } }), dueItems: [paper] })).toEqual([
      'start-up-action-open',
    ]);
    expect(
      at({
        signatures: [signed('scenarios'), signed('check'), signed('approval', '2025-03-10T08:00:00.000Z')],
      }),
    ).toEqual(['approval-aged']);
    const owned = {
      ...item,
      kind: 'deficiency' as const,
      document: 'doc1',
      due: '2026-06-01',
      interim: says('watched'),
      outcome: outcome().hash,
    };
    const documents = [documentFacts({ outcomes: [outcome({ inherited: true })] })];
    expect(at({ documents, dueItems: [owned] })).toEqual(['deficiency-unowned']);
    expect(at({ documents, dueItems: [{ ...owned, signature: 'sg' }] })).toEqual([]);
  });
});
