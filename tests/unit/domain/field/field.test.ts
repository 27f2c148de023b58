/* The field sheet: which lines a revision makes, what is asked before anything is shown, and when a reading agrees. */
import { describe, expect, it } from 'vitest';
import { type Basis } from '@domain/basis';
import {
  askOf,
  changesPlant,
  compareSeen,
  discrepancyOf,
  faultsOfEntry,
  fieldLines,
  type FieldEntry,
  type FieldLine,
  halfDigit,
} from '@domain/field';
import { basis, q, says } from '../case/fixture';

const base = basis();
const point = (over: Record<string, unknown>): Basis =>
  basis({ reliefPoints: base.reliefPoints.map((each) => ({ ...each, ...over })) });
const labels = (lines: FieldLine[]): string[] => lines.map((line) => line.label);

describe('the lines of a field sheet', () => {
  it('has none when nothing on the plant changes: a text, an origin, a note', () => {
    const words = basis({
      scenarios: base.scenarios.map((each) => ({
        ...each,
        reason: says('Another reason that is long enough, of V-1.'),
      })),
    });
    const origin = point({
      set: { value: 10, unit: 'bar_g', text: '10.0', origin: { kind: 'plate', ref: 'photo 3' } },
    });
    expect([changesPlant(words, base), changesPlant(origin, base), changesPlant(base, base)]).toEqual([
      false,
      false,
      false,
    ]);
    expect(changesPlant(base, undefined)).toBe(true);
  });
  it('makes a full sheet of a changed relief point, in walking order', () => {
    const lines = fieldLines(point({ orifice: { letter: 'N' } }), base);
    expect([...new Set(lines.map((line) => line.group))]).toEqual(
      ['identity', 'nameplate', 'certificate', 'seals', 'isolation', 'transport', 'piping', 'discharge'].map(
        (group) => `PSV-1 · ${group}`,
      ),
    );
    expect(labels(lines)).toEqual(
      expect.arrayContaining([
        'Tag plate',
        'Serial number on the plate',
        'Set pressure',
        'Cold differential test pressure (CDTP)',
        'Orifice letter',
        'Certified capacity, air',
        'Seals of cap and adjustment',
        'HV-1, inlet: position',
        'HV-1, inlet: number of the car-seal',
        'Where it discharges',
      ]),
    );
    expect(lines.find((line) => line.label === 'Orifice letter')).toMatchObject({
      key: 'doc1:reliefPoints/p1/orifice/letter',
      wants: 'N',
      document: 'doc1',
      holds: true,
    });
    expect(lines.map((line) => line.order)).toEqual(lines.map((_line, index) => index + 1));
    expect(new Set(lines.map((line) => line.key)).size).toBe(lines.length);
  });
  it('counts a valve, a line or a lock around the relief point as a change of it', () => {
    const isolations = base.isolations.map((each) => ({
      ...each,
      lock: { kind: 'car-seal', number: 'S-2290' },
    }));
    expect(
      fieldLines(basis({ isolations }), base).find((line) => line.key.endsWith('isolations/i1/lock/number'))
        ?.wants,
    ).toBe('S-2290');
    expect(
      changesPlant(
        basis({ lines: [{ ...base.lines[0], end: { to: 'atmosphere', location: 'stack' } }] }),
        base,
      ),
    ).toBe(true);
  });
  it('sees changed plates of equipment and sources, and changed field conditions', () => {
    const sources = basis({
      sources: [{ id: 'src1', tag: 'FV-1', kind: 'control-valve', valve: { coefficient: q(75, 'Kv') } }],
    });
    expect(labels(fieldLines(sources, base))).toEqual(['FV-1: coefficient on the plate']);
    const stop = basis({
      fieldConditions: [
        { id: 'c1', tag: 'FV-1-STOP', kind: 'travel-stop', requires: { words: 'at 90 %' }, photo: true },
      ],
    });
    expect(labels(fieldLines(stop, base))).toEqual(['FV-1-STOP: travel stop']);
    const equipment = basis({
      equipment: base.equipment.map((each) => ({
        ...each,
        sides: each.sides.map((side) => ({ ...side, ratings: [{ id: 'r1', mawp: q(11, 'bar_g') }] })),
      })),
    });
    expect(labels(fieldLines(equipment, base))).toEqual(['Equipment plate', 'MAWP on the plate, shell']);
  });
  it('asks before it shows: kind, unit and words, never the signed value', () => {
    const lines = fieldLines(base);
    const of = (label: string) => askOf(lines.find((line) => line.label === label) as FieldLine);
    expect(of('Set pressure')).toEqual({ kind: 'quantity', dimension: 'pressure-gauge', unit: 'bar_g' });
    expect(of('HV-1, inlet: position')).toEqual({ kind: 'word', choices: ['open', 'shut', 'between'] });
    expect(of('Tag plate')).toEqual({ kind: 'word', choices: [] });
  });
});

/* Tolerance = max(half the last printed digit, 0.5 % of the value), from the rule on field sheets; the cap on coarse printing is ours. */
describe('seen against signed', () => {
  const agrees = (
    wants: FieldLine['wants'],
    seen: ReturnType<typeof q> | string,
    more?: { barometer: ReturnType<typeof q> },
  ) => compareSeen({ label: 'It', wants }, seen, more).agrees;
  it.each([
    ['150 psi plate, 10.34 barg signed', q(10.34, 'bar_g'), q(150, 'psig'), true],
    ['a rounded plate', q(10.342, 'bar_g'), { ...q(10.3, 'bar_g'), text: '10.3' }, true],
    ['5.00 for 5.10', { ...q(5.1, 'bar_g'), text: '5.10' }, { ...q(5, 'bar_g'), text: '5.00' }, false],
    ['5 typed for 5.10', { ...q(5.1, 'bar_g'), text: '5.10' }, q(5, 'bar_g'), false],
    ['0.5 % off', { ...q(10, 'bar_g'), text: '10.000' }, { ...q(10.05, 'bar_g'), text: '10.050' }, true],
    ['0.6 % off', { ...q(10, 'bar_g'), text: '10.000' }, { ...q(10.06, 'bar_g'), text: '10.060' }, false],
    ['a flow for a pressure', q(10, 'bar_g'), q(10, 'kg/h'), false],
    ['gauge for absolute, no barometer', q(11.013, 'bar_abs'), q(10, 'bar_g'), false],
  ] as const)('%s', (_what, wants, seen, expected) => expect(agrees(wants, seen)).toBe(expected));
  it('ties gauge to absolute by the barometer', () =>
    expect(agrees(q(11.013, 'bar_abs'), q(10, 'bar_g'), { barometer: q(1.01325, 'bar_abs') })).toBe(true));
  it('compares words as people write them', () => {
    expect([
      agrees('4 in x 6 in', '4 IN × 6 in'),
      agrees('in-service', ' In-Service '),
      agrees('S-2209', 'S-2290'),
      agrees('open', 'shut'),
    ]).toEqual([true, true, false, false]);
    expect([agrees('open', q(1, 'm')), agrees(q(1, 'm'), 'open'), agrees(undefined, 'KW1')]).toEqual([
      false,
      false,
      true,
    ]);
  });
  it('knows half of the last printed digit', () =>
    expect([
      halfDigit({ ...q(5.1, 'bar_g'), text: '5.10' }),
      halfDigit(q(5.1, 'bar_g')),
      halfDigit(q(150, 'psig')),
      halfDigit({ ...q(5.1, 'bar_g'), text: '5,10' }),
    ]).toEqual([0.005, 0.05, 0.5, 0.005]));
});

describe('entries and discrepancies', () => {
  const line: FieldLine = {
    key: 'doc1:reliefPoints/p1/cdtp',
    document: 'doc1',
    order: 1,
    group: 'g',
    label: 'CDTP',
    wants: { ...q(5.1, 'bar_g'), text: '5.10' },
    photo: true,
    holds: true,
  };
  const entry = (over: Partial<FieldEntry>): FieldEntry => ({
    id: 'e1',
    case: 'c',
    line: line.key,
    as: 'verifier',
    files: ['f'],
    by: 'tom',
    saw: 'x',
    got: 'x',
    device: 'phone',
    seen: { ...q(5.1, 'bar_g'), text: '5.10' },
    ...over,
  });
  it('makes a discrepancy of a verifier’s reading that differs, owned by who saw it', () => {
    const seen = { ...q(5, 'bar_g'), text: '5.00' };
    expect(discrepancyOf(line, entry({ seen }))).toMatchObject({
      entry: 'e1',
      holds: true,
      owner: 'tom',
      sentence: 'CDTP: Differs by more than rounding: seen 5.00 barg, signed 5.10 barg.',
    });
    expect(discrepancyOf(line, entry({}))).toBeUndefined();
    expect(discrepancyOf(line, entry({ seen, as: 'installer' }))).toBeUndefined();
  });
  it('asks for a reading or a second means with a second person, and for the photograph, without telling what was signed', () => {
    expect(faultsOfEntry(line, entry({}))).toEqual([]);
    const faults = [
      ...faultsOfEntry(line, entry({ seen: undefined, files: [] })),
      ...faultsOfEntry(line, entry({ seen: undefined, cannot: { why: 'reach', means: '', second: 'tom' } })),
    ];
    expect(faults).toHaveLength(4);
    expect(faults.join(' ')).not.toMatch(/5\.1/);
    expect(
      faultsOfEntry(
        line,
        entry({ seen: undefined, cannot: { why: 'reach', means: 'drone', second: 'ivo' } }),
      ),
    ).toEqual([]);
  });
});
