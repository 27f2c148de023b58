/* A signature falls exactly when something it binds moved; acts and nominations are refused with sentences. */
import { describe, expect, it } from 'vitest';
import {
  type BindFacts,
  boundParts,
  conflictsOf,
  conflictsOfSeat,
  isValid,
  meaningOf,
  movedParts,
  parseAct,
  signatureHash,
  type SignedGate,
} from '@domain/case';
import { aCase, says } from './fixture';

const hash = (letter: string): string => letter.repeat(64);
const finding = {
  id: 'x',
  case: 'case1',
  number: 1,
  weight: 'remark' as const,
  place: 'p',
  state: 'open' as const,
  raisedBy: 'ben',
  posts: [],
};
const stand: BindFacts = {
  case: 'case1',
  brief: aCase().brief,
  rules: { id: 'rules1', judgementHash: hash('a') },
  documents: [
    {
      document: 'doc1',
      documentHash: hash('b'),
      importsHash: hash('c'),
      sheetHashes: [hash('d'), hash('e')],
    },
    { document: 'doc2', documentHash: hash('1'), importsHash: hash('2'), sheetHashes: [] },
  ],
  unseen: [],
  findings: [finding],
  field: { lines: [], entries: [], discrepancies: [] },
};
const sign = (gate: SignedGate, document?: string) => ({
  id: 'sg',
  gate,
  ...(document ? { document } : {}),
  bound: boundParts(gate, stand, document ? { document } : {}),
});
const doc = (over: object) => ({
  ...stand,
  documents: [
    { ...(stand.documents[0] as object), ...over } as BindFacts['documents'][number],
    ...stand.documents.slice(1),
  ],
});

describe('what a signature binds', () => {
  it('stands while nothing moves, falls when a void row names it', () => {
    expect(isValid(sign('check'), stand)).toBe(true);
    expect(isValid(sign('check'), stand, ['sg'])).toBe(false);
  });
  it.each([
    ['document', doc({ documentHash: hash('f') }), 'document'],
    ['imports', doc({ importsHash: hash('f') }), 'imports'],
    ['sheets', doc({ sheetHashes: [hash('d')] }), 'evaluation'],
    ['rules', { ...stand, rules: { id: 'rules2', judgementHash: hash('f') } }, 'rules'],
    ['brief', { ...stand, brief: { ...stand.brief, effect: says('more') } }, 'brief'],
    ['must-fix finding', { ...stand, findings: [{ ...finding, weight: 'must-fix' as const }] }, 'findings'],
  ] as const)('falls when the %s moved', (_what, now, part) =>
    expect(movedParts(sign('check'), now).map((each) => each.part)).toEqual([part]),
  );
  it('outlives what does not touch it: order of sheets, conduct rules, progress of papers, later findings and answers', () => {
    const paper = {
      id: 'n',
      kind: 'procedure',
      reference: 'OP-7',
      from: '',
      to: '',
      when: 'after' as const,
      state: 'drafted' as const,
    };
    const before = { ...stand, brief: { ...stand.brief, papers: [paper] } };
    const signed = { id: 'sg', gate: 'check', bound: boundParts('check', before) };
    const after = { ...before, brief: { ...before.brief, papers: [{ ...paper, state: 'issued' as const }] } };
    expect(isValid(signed, after)).toBe(true);
    expect(isValid(sign('check'), doc({ sheetHashes: [hash('e'), hash('d')] }))).toBe(true);
    expect(isValid(sign('check'), { ...stand, rules: { id: 'rules2', judgementHash: hash('a') } })).toBe(
      true,
    );
    expect(
      isValid(sign('check'), {
        ...stand,
        findings: [
          { ...finding, state: 'answered' as const },
          { ...finding, id: 'y', number: 2 },
        ],
      }),
    ).toBe(true);
  });
  it('binds one system at the gate of the field', () => {
    const signed = sign('field', 'doc2');
    expect(new Set(signed.bound.filter((part) => part.part !== 'rules').map((part) => part.of))).toEqual(
      new Set(['doc2']),
    );
    expect(isValid(signed, doc({ documentHash: hash('f') }))).toBe(true);
  });
  it('has a meaning for each gate and a hash over who, what, when and which page', () => {
    const whole = {
      ...sign('approval'),
      person: 'eva',
      meaning: meaningOf('approval'),
      page: hash('9'),
      at: '2026-03-20T08:00:00.000Z',
      zone: 'UTC',
    };
    expect(signatureHash(whole)).toMatch(/^[0-9a-f]{64}$/);
    for (const change of [
      { page: hash('8') },
      { person: 'ben' },
      { meaning: 'x' },
      { at: '2026-03-20T08:00:01.000Z' },
      { bound: [] },
    ])
      expect(signatureHash({ ...whole, ...change })).not.toBe(signatureHash(whole));
    expect(meaningOf('scenarios')).toMatch(/figures .* are mine/);
  });
});

describe('independence', () => {
  const roles = {
    ann: ['originator', 'checker', 'approver', 'operations'] as const,
    ben: ['checker', 'approver', 'operations'] as const,
  };
  const names = { ann: 'Ann', ben: 'Ben' };
  const pairs = ['originator', 'checker', 'approver', 'operations'] as const;
  it.each(pairs.flatMap((a) => pairs.filter((b) => b > a).map((b) => [a, b] as const)))(
    '%s and %s by one person',
    (a, b) => {
      const seats = [a, b].map((role) => ({ id: role, role, person: 'ann' }));
      const apart = a === 'originator' || b === 'originator' || a === 'checker' || b === 'checker';
      expect(conflictsOf({ seats, roles, names }).length > 0).toBe(apart);
    },
  );
  it('refuses a checker who wrote a sheet or looked first, and one without the role', () => {
    const base = { seats: [], roles, names };
    expect(conflictsOfSeat('ben', 'checker', base)).toEqual([]);
    expect(
      conflictsOfSeat('ben', 'checker', { ...base, authors: [{ person: 'ben', sheet: 'load:x' }] })[0]
        ?.sentence,
    ).toMatch(/wrote a sheet/);
    expect(conflictsOfSeat('ben', 'checker', { ...base, lookedFirst: ['ben'] })[0]?.sentence).toMatch(
      /have seen/,
    );
    expect(conflictsOfSeat('ben', 'originator', base)[0]?.sentence).toMatch(/do not have the role/);
  });
});

describe('bodies of acts', () => {
  it('takes what is right', () => {
    expect(parseAct('RETURN', { to: 'scenarios', reason: ' The curve is old. ' })).toEqual({
      ok: true,
      value: { to: 'scenarios', reason: 'The curve is old.' },
    });
    expect(
      parseAct('unseen', {
        entries: [{ document: 'd', scope: 's', value: { value: 5, unit: 'bar_g', text: '5.0' } }],
      }).ok,
    ).toBe(true);
    expect(parseAct('SIGN', { password: 'x', pageHash: hash('a') })).toMatchObject({
      ok: true,
      value: { requirements: [] },
    });
  });
  it.each([
    ['PASS', { password: '', pageHash: hash('a') }, 'password'],
    ['PASS', { password: 'x' }, 'pageHash'],
    ['RETURN', { to: 'nowhere', reason: 'x' }, 'to'],
    ['RETURN', { to: 'draft', reason: ' ' }, 'reason'],
    ['HOLD', { reason: 'x'.repeat(4001), review: '2026-04-01' }, 'reason'],
    ['HOLD', { reason: 'x', review: '1 April' }, 'review'],
    ['answer-affected', { document: 'd', answer: 'not-affected' }, 'reason'],
    ['raise', { class: 'permanent', title: 'Bigger trim', systems: [] }, 'systems'],
    ['unseen', { entries: [{ document: 'd', scope: 's' }] }, 'entries/0'],
    ['reconcile', { text: { type: 'doc', content: ['x'.repeat(100_001)] } }, 'text'],
    ['RESUME', { extra: 1 }, ''],
  ] as const)('refuses %s with a sentence at %s', (act, body, path) => {
    const answer = parseAct(act, body);
    expect(answer).toMatchObject({
      ok: false,
      problem: { code: 'SCHEMA', errors: [expect.objectContaining({ path })] },
    });
    if (!answer.ok) expect(answer.problem.detail.length).toBeGreaterThan(10);
  });
});
