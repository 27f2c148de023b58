/* Gate of the calculation check: unseen check, agreements, findings, a basis that moved. */
import { describe, expect, it } from 'vitest';
import { type GateFacts, originatorsValue, type UnseenEntry, unseenState } from '@domain/case';
import { aCase, codes, documentFacts, evaluation, q, says, sentences } from './fixture';

const changed = documentFacts({ baseEvaluation: evaluation(1900, 'before') });
/** Enters everything that is asked, as the originator has it, then reveals. */
function worked(
  of = changed,
  bend: (entry: UnseenEntry) => UnseenEntry = (entry) => entry,
): Partial<GateFacts> {
  const unseen: UnseenEntry[] = [];
  for (let round = 0; round < 4; round += 1)
    for (const item of unseenState(of, { case: aCase(), unseen, reveals: [] }).mayEnter) {
      const value = originatorsValue(of, item);
      const said = typeof value === 'string' ? { word: value } : value ? { value } : {};
      unseen.push(
        bend({
          id: item.scope,
          case: 'case1',
          document: 'doc1',
          scope: item.scope,
          layer: item.layer,
          quantity: item.quantity,
          round: 1,
          by: 'ben',
          at: '2026-03-12T08:00:00.000Z',
          ...said,
          ...(value === undefined ? {} : { against: value }),
        }),
      );
    }
  const agreements = Object.values(of.evaluation?.sheets ?? {}).map((sheet) => ({
    case: 'case1',
    document: 'doc1',
    sheet: sheet.key,
    hash: sheet.hash,
    by: 'ben',
    at: '2026-03-13T08:00:00.000Z',
  }));
  return {
    documents: [of],
    unseen,
    agreements,
    reveals: [{ document: 'doc1', person: 'ben', at: '2026-03-12T09:00:00.000Z' }],
  };
}

describe('the gate of the calculation check', () => {
  it('is open when nothing changed, and when all is worked, revealed and agreed', () => {
    expect(codes('check', {})).toEqual([]);
    expect(codes('check', worked())).toEqual([]);
  });
  it('waits for the unseen check, for the reveal, and for a difference to be reconciled', () => {
    expect(new Set(codes('check', { ...worked(), unseen: [] }))).toEqual(new Set(['unseen-check-missing']));
    expect(codes('check', { ...worked(), reveals: [] })).toEqual(['unseen-check-missing']);
    const apart = (entry: UnseenEntry): UnseenEntry =>
      entry.scope.endsWith('#A_required') ? { ...entry, value: q(2400, 'mm2') } : entry;
    expect(codes('check', worked(changed, apart))).toEqual(['unseen-check-apart']);
    const reconciled = (entry: UnseenEntry): UnseenEntry => ({
      ...apart(entry),
      reconciled: { text: says('Read at the wrong scale.'), by: 'ben', at: '2026-03-13T08:00:00.000Z' },
    });
    expect(codes('check', worked(changed, reconciled))).toEqual([]);
  });
  it('wants every changed sheet agreed at its present hash', () => {
    const all = worked();
    const agreements = all.agreements ?? [];
    expect(codes('check', { ...all, agreements: agreements.slice(1) })).toEqual(['sheet-not-agreed']);
    expect(
      codes('check', {
        ...all,
        agreements: agreements.map((each, index) => (index === 0 ? { ...each, hash: 'old' } : each)),
      }),
    ).toEqual(['agreement-stale']);
    expect(
      codes('check', {
        ...all,
        agreements: agreements.map((each, index) => (index === 0 ? { ...each, undone: '2026-03-14' } : each)),
      }),
    ).toEqual(['sheet-not-agreed']);
  });
  it('holds at must-fix findings only, and at a basis that moved', () => {
    const finding = { id: 'x', case: 'case1', number: 1, place: 'p', raisedBy: 'ben', posts: [] };
    expect(codes('check', { findings: [{ ...finding, weight: 'must-fix', state: 'answered' }] })).toEqual([
      'finding-open',
    ]);
    expect(
      codes('check', {
        findings: [
          { ...finding, weight: 'must-fix', state: 'closed' },
          { ...finding, weight: 'remark', state: 'open' },
        ],
      }),
    ).toEqual([]);
    expect(codes('check', { documents: [documentFacts({ inForce: 'rev9' })] })).toEqual(['basis-moved']);
    // A signed revision that waits to be installed is shown, it shuts nothing: approved in one order, installed in the other.
    expect(codes('check', { documents: [documentFacts({ pendingCase: 'KW-2026-001' })] })).toEqual([]);
  });
  it('tells a reader whose view is hidden that sheets wait, not which', () => {
    const of = { ...worked(), agreements: [] };
    const waiting = sentences('check', { ...of, hidden: true });
    expect(waiting).toEqual([expect.stringMatching(/^SYS-1: the sheets that changed are agreed after/)]);
    const named = sentences('check', of);
    expect(named.length).toBeGreaterThan(0);
    expect(named.filter((one) => waiting.includes(one))).toEqual([]);
  });
});
