/* Every reference case reproduces within its tolerance; the source stands in the name of each test. */
import { describe, expect, it } from 'vitest';
import { calculate } from '../../src/engine/calc';
import { methodById } from '../../src/engine/catalog';
import aGas from './a-gas.json';
import bSteam from './b-steam.json';
import bWater from './b-water.json';
import cLiquid from './c-liquid.json';
import { disagreements, type ReferenceCase } from './compare';
import dTwoPhase from './d-two-phase.json';
import eFire from './e-fire.json';
import fLoads from './f-loads.json';
import gLines from './g-lines.json';
import hLimits from './h-limits.json';
import iAreas from './i-areas.json';
import jDevices from './j-devices.json';
import kTanks from './k-tanks.json';
import pProperties from './p-properties.json';

const FILES = {
  aGas,
  bSteam,
  bWater,
  cLiquid,
  dTwoPhase,
  eFire,
  fLoads,
  gLines,
  hLimits,
  iAreas,
  jDevices,
  kTanks,
  pProperties,
};

describe.each(Object.entries(FILES))('%s', (_file, { cases }) => {
  const all = cases as unknown as ReferenceCase[];
  it.each(all.map((one) => [`${one.id}: ${one.checks} [${one.source}]`, one] as const))(
    '%s',
    (_name, one) => {
      const answer = calculate({ topic: one.topic, inputs: one.inputs });
      expect(answer.refused).toBeUndefined();
      const wrong = Object.entries(one.expected).flatMap(([name, wanted]) =>
        disagreements(name, answer.outputs[name], wanted),
      );
      expect(wrong).toEqual([]);
    },
  );

  it('names only outputs that its methods declare', () => {
    for (const one of all) {
      const declared = methodById(one.topic)?.outputs.map((o) => o.name) ?? [];
      expect(declared).toEqual(expect.arrayContaining(Object.keys(one.expected)));
    }
  });
});

describe('the comparison itself', () => {
  it('finds a value that is off by more than its tolerance, a wrong word and a missing output', () => {
    const tolerance = { value: 100, unit: 'mm2', rel_tol: 0.01 };
    expect(disagreements('A', { value: 102, unit: 'mm2' }, tolerance)).toHaveLength(1);
    expect(disagreements('A', { value: 1.00001e-4, unit: 'm2' }, tolerance)).toEqual([]);
    expect(disagreements('A', { value: 'L', unit: '-' }, { value: 'K', unit: '-', rel_tol: 0 })).toHaveLength(
      1,
    );
    expect(disagreements('A', undefined, tolerance)).toEqual(['A is missing']);
  });
});
