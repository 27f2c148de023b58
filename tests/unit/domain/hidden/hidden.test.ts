/* The hidden view: for whom it holds, and that no kind of thing lets a result through. */
import { describe, expect, it } from 'vitest';
import {
  HIDDEN_WORD,
  hiddenFor,
  isHidden,
  isHiddenCase,
  maskChange,
  maskDocument,
  maskEvaluation,
  maskOutcome,
  maskProse,
  maskRich,
  maskRow,
  maskTrail,
  NOTHING_HIDDEN,
  project,
  projectRows,
  projectValue,
  readingsOf,
  withhold,
  isWithheld,
} from '@domain/hidden';
import { basis, evaluation, outcome, q, says } from '../case/fixture';

const checker = (person: string, until?: string) => ({
  id: 's',
  role: 'checker' as const,
  person,
  ...(until ? { until } : {}),
});
const open = [
  { case: 'case1', seats: [checker('ben')], documents: ['doc1', 'doc2'], left: true },
  { case: 'case2', seats: [checker('ben')], documents: ['doc3'], left: false },
];

describe('for whom it holds', () => {
  it('follows the checker and all documents of the case, while something is left', () => {
    const hidden = hiddenFor({ persons: ['ben'], cases: open });
    expect([...hidden.cases]).toEqual(['case1']);
    expect([...hidden.documents]).toEqual(['doc1', 'doc2']);
    expect([
      isHidden(hidden, 'doc1'),
      isHidden(hidden, 'doc3'),
      isHidden(hidden, undefined),
      isHiddenCase(hidden, 'case1'),
    ]).toEqual([true, false, false, true]);
  });
  it('holds for a stand-in, not for others, not for a seat that ended', () => {
    expect(hiddenFor({ persons: ['eva', 'ben'], cases: open }).cases.size).toBe(1);
    expect(hiddenFor({ persons: ['eva'], cases: open }).cases.size).toBe(0);
    expect(
      hiddenFor({
        persons: ['ben'],
        cases: [{ ...open[0], seats: [checker('ben', '2026-01-01')] } as (typeof open)[number]],
      }).cases.size,
    ).toBe(0);
  });
});

describe('prose', () => {
  it.each([
    ['The load is 13 909.6 kg/h at 12.01 bara.', /13|909|12\.01/],
    ['use 92 %, inlet 2.1% of set', /92|2\.1/],
    ['between 3 and 5 barg', /3|5/],
    ['A = 2,130 mm² (letter M)', /2,130|letter M/],
    ['150 psig', /150/],
    ['−12 °C', /12/],
    ['1.2e4 kg/h', /1\.2e4/],
    ['it is inadequate by half', /inadequate/],
    ['an orifice N fits', /orifice N/],
  ])('takes the figures out of "%s"', (text, leak) => {
    expect(maskProse(text)).not.toMatch(leak);
    expect(maskProse(text)).toContain(HIDDEN_WORD);
  });
  it('leaves tags, revisions, standards and counts', () => {
    const text = 'PSV-110A on V-101, P&ID 4711 rev 7, API 520-1 7.2, 2 valves in service.';
    expect(maskProse(text)).toBe(text);
  });
  it('takes live figures out of rich text, and numbers that marks split from their unit', () => {
    const live = {
      type: 'figure',
      attrs: { doc: 'this', side: 'this', path: 'x', affirmed: q(13909.6, 'kg/h') },
    };
    const rich = {
      type: 'doc',
      content: [
        { type: 'paragraph', content: [{ type: 'text', text: 'so ' }, live] },
        {
          type: 'paragraph',
          content: [
            { type: 'text', text: '2130', marks: [{ type: 'bold' }] },
            { type: 'text', text: ' mm2 are needed' },
          ],
        },
      ],
    };
    expect(JSON.stringify(maskRich(rich))).not.toMatch(/13909|2130/);
    expect(JSON.stringify(maskRich(rich))).toMatch(/are needed/);
  });
});

describe('a document', () => {
  const doc = basis({
    externalSheets: [
      {
        id: 'x1',
        about: 'size',
        title: 'Area of 2 130 mm2',
        author: 'Ann',
        method: 'two-phase',
        inputs: { W: q(777, 'kg/h') },
        figures: { A_required: q(2130, 'mm2') },
        words: { letter: 'P' },
      },
    ],
    assumptions: [{ id: 'as1', text: says('The area is 2130 mm2.') }],
    justifications: [
      {
        id: 'j1',
        code: 'inlet-loss-high',
        subject: 'lines/l1',
        values: { loss: q(4.1, '%'), said: 'four' },
        hash: 'a'.repeat(64),
        text: says('At 4.1 % it was watched.'),
        by: 'ann',
        on: '2026-03-01',
      },
    ],
    equipment: basis().equipment.map((each) => ({
      ...each,
      sides: each.sides.map((side) => ({
        ...side,
        ratings: side.ratings.map((rating) => ({
          ...rating,
          mawp: {
            value: 10,
            unit: 'bar_g',
            text: '10.0',
            origin: { kind: 'plate', ref: 'photo 3 shows 10 barg' },
          },
        })),
      })),
    })),
  });
  const masked = maskDocument(doc, readingsOf(doc));
  const text = JSON.stringify(masked);
  it('withholds stated loads, external figures and words, chosen orifices, capacity, justified values', () => {
    for (const leak of ['9000', '2130', '777', '"P"', '"letter":"M"', '12000', '10.2', '4.1', 'four'])
      expect(text, leak).not.toContain(leak);
  });
  it('withholds the values of readings but says where they are read', () => {
    const rating = masked.equipment[0]?.sides[0]?.ratings[0];
    expect(rating?.mawp).toEqual({
      unknown: HIDDEN_WORD,
      hidden: true,
      origin: { kind: 'plate', ref: `photo 3 shows ${HIDDEN_WORD}` },
    });
    for (const leak of ['44.1', '10.0', '63']) expect(text, leak).not.toContain(leak);
    expect(masked.lines[0]?.end?.to).toBe(HIDDEN_WORD);
  });
  it('leaves tags, ids, names, kinds and dispositions', () => {
    expect(masked.reliefPoints[0]).toMatchObject({ id: 'p1', tag: 'PSV-1', axes: { balance: 'none' } });
    expect(masked.scenarios.map((each) => each.disposition)).toEqual([
      'credible',
      'credible',
      'not-applicable',
    ]);
    expect(doc.reliefPoints[0]?.orifice.letter).toBe('M');
  });
});

describe('what follows from a document', () => {
  const numbers = /\d{3,}\.?\d*|marginal|governing/;
  it('leaves of an evaluation only which sheets there are', () => {
    expect(maskEvaluation(evaluation()).sheets).toHaveLength(6);
    expect(JSON.stringify(maskEvaluation(evaluation()))).not.toMatch(numbers);
  });
  it('leaves of an outcome its code and place', () => {
    const masked = maskOutcome(outcome({ values: { set: q(12, 'bar_g') } }));
    expect(masked).toMatchObject({ code: 'set-above-mawp', subject: 'reliefPoints/p1/set', values: {} });
    expect(masked.sentence).not.toMatch(/\d+ barg/);
  });
  it('leaves of a difference what was touched', () => {
    const masked = maskChange({
      path: 'reliefPoints/p1/set',
      label: 'set pressure',
      where: 'x',
      kind: 'moved',
      old: q(10, 'bar_g'),
      now: q(12, 'bar_g'),
      words: [],
    });
    expect(masked).toEqual({
      path: 'reliefPoints/p1/set',
      label: 'set pressure',
      where: 'x',
      kind: 'moved',
      old: HIDDEN_WORD,
      now: HIDDEN_WORD,
    });
  });
  it('makes result columns of a register row null, in either spelling', () => {
    const row = {
      tag: 'SYS-1',
      use: 0.92,
      requiredSi: 0.00213,
      requiredUnit: 'mm2',
      governing_name: 'fire',
      verdict: 'marginal',
      letter: 'M',
      setSi: 1e6,
      service: 'vapour',
      user: 'ann',
    };
    expect(maskRow(row)).toEqual({
      tag: 'SYS-1',
      use: null,
      requiredSi: null,
      requiredUnit: null,
      governing_name: null,
      verdict: null,
      letter: null,
      setSi: null,
      service: 'vapour',
      user: 'ann',
      hidden: true,
    });
    const hidden = { cases: new Set<string>(), documents: new Set(['doc1']) };
    const rows = projectRows(
      [
        { document: 'doc1', use: 1 },
        { document: 'doc2', use: 2 },
      ],
      (each) => each.document,
      hidden,
    );
    expect(rows).toEqual([
      { document: 'doc1', use: null, hidden: true },
      { document: 'doc2', use: 2 },
    ]);
  });
  it('leaves of a trail entry that hides the act alone', () => {
    const hidden = hiddenFor({ persons: ['ben'], cases: open });
    const entry = {
      site: 's',
      seq: 1,
      at: 'x',
      act: 'edit-document',
      by: 'ann',
      case: 'case1',
      subject: 'doc1',
      why: 'to 12 barg',
      changes: [{ path: 'p', old: 10, new: 12 }],
      hides: true,
      prev: '',
      hash: '',
    };
    expect(maskTrail(entry, hidden)).toMatchObject({ act: 'edit-document', changes: [] });
    expect(maskTrail(entry, hidden)).not.toHaveProperty('why');
    expect(maskTrail({ ...entry, hides: false }, hidden).changes).toHaveLength(1);
    expect(maskTrail(entry, NOTHING_HIDDEN)).toBe(entry);
  });
  it('projects by document or case, and leaves everything of others as it is', () => {
    const hidden = hiddenFor({ persons: ['ben'], cases: open });
    expect(project(7, { document: 'doc1' }, hidden, () => 'masked')).toBe('masked');
    expect(project(7, { case: 'case1' }, hidden, () => 'masked')).toBe('masked');
    expect(project(7, { document: 'doc3', case: 'case2' }, hidden, () => 'masked')).toBe(7);
    expect(isWithheld(projectValue(7, 'doc2', hidden))).toBe(true);
    expect(withhold({ a: 1, b: 2 }, ['b'])).toEqual({ a: 1, b: { hidden: true } });
  });
});
