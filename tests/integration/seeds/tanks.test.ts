/*
 * The tanks of the invented site worked by the engine, against its stored results (an independent implementation in Python, to
 * six digits; its README says that its venting constants are from memory). Loads agree to the last digit stored; areas are 0.06 %
 * larger, because the stored ones take the printed 17.9 of the subcritical equation where the engine takes the exact constant.
 */
import { expect, test } from 'vitest';
import { evaluate } from '@domain/evaluate';
import { convert, type Q } from '@engine/quantity';
import { answerId, basisOf, resultsOf, scenarioKey, SITE } from '../../../seeds/convert';
import { importSetOf } from '../../../seeds/load/imports';
import { siteRules } from '../../../seeds/load/rules';
import stored from '../../reference/ketterwold-computed.json';

type Row = { group: string; relief_load: Q; required_area: Q; detail: Record<string, Q> };
const STORED = stored.systems as unknown as Record<string, { causes: Record<string, Row[]> }>;
const DEVICES = stored.systems as unknown as Record<string, { devices: Record<string, Record<string, Q>> }>;
const { judgement } = siteRules('2026-01-05');

const rows = ['SYS-501', 'SYS-502'].flatMap((tag) =>
  Object.entries(STORED[tag]!.causes).flatMap(([cause, all]) =>
    all.map((row) => [`${tag} ${cause}`, tag, cause, row] as const),
  ),
);
const sheetsOf = (tag: string) => {
  const system = SITE.systems.find((one) => one.id === tag)!;
  const basis = basisOf(system, resultsOf(tag));
  return evaluate(basis, judgement, importSetOf(basis)).sheets;
};
const sheets: Record<string, ReturnType<typeof sheetsOf>> = {
  'SYS-501': sheetsOf('SYS-501'),
  'SYS-502': sheetsOf('SYS-502'),
};

function ratio(got: unknown, expected: Q): number {
  return typeof got === 'object' && got !== null
    ? convert(got as Q, expected.unit) / expected.value
    : Number.NaN;
}

test.each(rows)('%s is worked by the engine and reproduces', (_name, tag, cause, row) => {
  const id = `${scenarioKey(cause)}/${answerId(row.group)}`;
  const load = sheets[tag]![`load:${id}`]!;
  const size = sheets[tag]![`size:${id}`]!;
  expect([load.method, size.method]).toEqual([expect.stringMatching(/^k\./), 'k.vent-area@1']);
  expect(ratio(load.outputs['relief_load'], row.relief_load)).toBeCloseTo(1, 5);
  for (const [name, q] of Object.entries(row.detail))
    expect([name, ratio(load.outputs[name], q)]).toEqual([name, expect.closeTo(1, 5)]);
  const area = ratio(size.outputs['A_required'], row.required_area);
  expect(area).toBeGreaterThan(1.0004);
  expect(area).toBeLessThan(1.0007);
});

const VENTS = ['SYS-501', 'SYS-502'].flatMap((tag) =>
  Object.entries(DEVICES[tag]!.devices).flatMap(([device, results]) =>
    Object.entries(results).map(([name, q]) => [`${device} ${name}`, tag, device, name, q] as const),
  ),
);

test.each(VENTS)('%s of the vent is worked and reproduces within 0.1 %', (_name, tag, device, name, q) => {
  const id = `rp_${device.toLowerCase().replace('-', '')}`;
  const own = sheets[tag]![`rated:${id}`]!;
  const sheet =
    name.endsWith('vacuum') && own.inputs['direction'] !== 'in' ? sheets[tag]![`rated:${id}/vacuum`]! : own;
  expect(sheet.method).toBe('k.weighted-vent@1');
  expect(Math.abs(ratio(sheet.outputs['capacity_air'], q) - 1)).toBeLessThan(0.001);
});

test('the ten answers of both tanks need no external sheet for load or size', () => {
  expect(rows).toHaveLength(10);
  for (const tag of ['SYS-501', 'SYS-502'])
    expect(
      Object.values(sheets[tag]!).filter(
        (one) => /^(load|size):/.test(one.key) && one.method.startsWith('external:'),
      ),
    ).toEqual([]);
});

test('a tank takes what it already knows: volume, shape, level, design pressure and the direction of flow', () => {
  const fire = sheets['SYS-501']![`load:${scenarioKey('fire-wetted')}/${answerId('G3')}`]!;
  expect(fire.from).toMatchObject({
    D: 'equipment/eq_tk501/shape/diameter',
    H: expect.stringContaining('equipment/eq_tk501/levels/'),
    elevation_of_bottom: 'equipment/eq_tk501/elevation',
    design_pressure: expect.stringContaining('#MAWP'),
  });
  const vacuum = sheets['SYS-502']![`size:${scenarioKey('vacuum')}/${answerId('G2')}`]!;
  expect(vacuum.inputs['direction']).toBe('in');
  expect(vacuum.inputs['W']).toBeUndefined();
});
