/* Loads on the small basis: which side's fluid counts, what the document fills in, and what is no flow. */
import { describe, expect, it } from 'vitest';
import { type Basis, type Input } from '@domain/basis';
import { type Evaluation } from '@domain/evaluate';
import { workMethod } from '@engine/catalog';
import { type Q } from '@engine/quantity';
import { basisWith, evaluated, first } from '../../../fixtures/basis';

const LOAD = 'load:abnormal-heat-input/an_1';
const FIRE = 'fire-wetted/an_1';
const q = (value: number, unit = '-'): Q => ({ value, unit });

function answerOf(basis: Basis, key: string) {
  return first(basis.scenarios.find((one) => one.key === key)!.answers);
}

function worked(
  method: string,
  inputs: Record<string, Input>,
  change: (basis: Basis) => void = () => undefined,
): Evaluation {
  return evaluated(
    basisWith((basis) => {
      answerOf(basis, 'abnormal-heat-input').load = { by: 'method', method, inputs };
      change(basis);
    }),
  );
}

/** Gas of the high side, beside the fluid of the answer. */
function withGas(basis: Basis): void {
  const own = first(basis.fluids);
  basis.fluids.push({
    ...own,
    id: 'f_gas',
    name: 'Gas of the high side',
    phase: 'gas',
    T: q(310, 'K'),
    M: q(18, 'kg/kmol'),
    Z: q(0.93),
    k: q(1.3),
  });
}

const VALVE: Record<string, Input> = { coefficient: q(12, 'Kv'), P1: q(25, 'bar_g'), xT: q(0.7) };

describe('the other side of a load', () => {
  it('gives its own fluid to the valve, and the relieving pressure is the low side', () => {
    const { sheets } = worked(
      'f.control-valve-gas',
      { ...VALVE, upstream_fluid: { list: ['f_gas'] } },
      withGas,
    );
    const sheet = sheets[LOAD]!;
    expect(sheet.refused).toBeUndefined();
    expect(sheet.from['M']).toBe('fluids/f_gas/M');
    expect(sheet.from['P2']).toBe('sheets/limit:abnormal-heat-input/an_1#P1');
    const P2 = sheets['limit:abnormal-heat-input/an_1']!.outputs['P1'] as Q;
    const alone = workMethod('f.control-valve-gas', {
      coefficient: q(12, 'Kv'),
      P1: q(25, 'bar_g'),
      xT: q(0.7),
      P2,
      atmospheric_pressure: sheet.inputs['atmospheric_pressure'] as Q,
      T: q(310, 'K'),
      M: q(18, 'kg/kmol'),
      Z: q(0.93),
      k: q(1.3),
    });
    expect((sheet.outputs['relief_load'] as Q).value).toBeCloseTo(
      (alone.outputs['relief_load'] as Q).value,
      9,
    );
  });

  it('never lends a missing figure from the fluid of the answer', () => {
    const without = (basis: Basis) => {
      withGas(basis);
      delete basis.fluids.at(-1)!.M;
    };
    const sheet = worked('f.control-valve-gas', { ...VALVE, upstream_fluid: { list: ['f_gas'] } }, without)
      .sheets[LOAD]!;
    expect(sheet.refused).toMatchObject({ code: 'INPUT_MISSING' });
  });

  it('leaves the density of what is displaced to the answer, when gas pushes liquid out', () => {
    const liquid = (basis: Basis) => {
      withGas(basis);
      Object.assign(first(basis.fluids), { phase: 'liquid', rhoLiquid: q(780, 'kg/m3') });
    };
    const sheet = worked('f.blowby-displacement', { ...VALVE, upstream_fluid: { list: ['f_gas'] } }, liquid)
      .sheets[LOAD]!;
    expect(sheet.refused).toBeUndefined();
    expect(sheet.from['rho']).toBe(`fluids/${first(basisWith(() => undefined).fluids).id}/rhoLiquid`);
    expect(sheet.from['Z']).toBe('fluids/f_gas/Z');
  });
});

describe('what a load method asks that nobody entered', () => {
  it('is never filled where it belongs to one part of a series', () => {
    const sheet = worked('f.settle-out', {
      volume: q(10, 'm3'),
      P: q(5, 'bar_g'),
      Z: q(1),
      volume_2: q(4, 'm3'),
      P_2: q(30, 'bar_g'),
      T_2: q(350, 'K'),
      Z_2: q(1),
    }).sheets[LOAD]!;
    expect(sheet.inputs['T']).toBeUndefined();
    expect(sheet.refused).toMatchObject({ code: 'INPUT_MISSING' });
  });

  it('is no load when the method finds no flow, in words', () => {
    const part = (n: string) => ({
      [`volume${n}`]: q(10, 'm3'),
      [`P${n}`]: q(5, 'bar_g'),
      [`T${n}`]: q(300, 'K'),
      [`Z${n}`]: q(1),
    });
    const sheet = worked('f.settle-out', { ...part(''), ...part('_2') }).sheets[LOAD]!;
    expect(sheet.refused).toMatchObject({ code: 'NO_FLOW_FOUND' });
    expect(sheet.refused!.text).toContain('finds no flow');
  });
});

describe('a gas-filled vessel in a fire', () => {
  const gasFire = (basis: Basis) => {
    Object.assign(first(basis.fluids), { phase: 'gas', M: q(28.01, 'kg/kmol'), k: q(1.4), Z: q(1) });
    const fire = answerOf(basis, 'fire-wetted');
    fire.load = {
      by: 'method',
      method: 'e.fire-unwetted',
      inputs: { normal_pressure: q(2, 'bar_g'), normal_temperature: q(12, 'degC'), T_wall: q(866, 'K') },
    };
    fire.size = { by: 'method', method: 'e.fire-unwetted', inputs: {} };
  };

  it('takes its shape from the equipment, and its area from the surface and temperatures of its load', () => {
    const { sheets } = evaluated(basisWith(gasFire));
    const load = sheets[`load:${FIRE}`]!;
    expect(load.refused).toBeUndefined();
    expect(load.from['D']).toMatch(/^equipment\/.+\/shape\/diameter$/);
    expect(load.inputs['liquid_level']).toBeUndefined();
    const size = sheets[`size:${FIRE}`]!;
    expect(size.refused).toBeUndefined();
    expect(size.from['A_exposed']).toBe(`sheets/load:${FIRE}#exposed_area`);
    expect(size.from['T1']).toBe(`sheets/load:${FIRE}#T1`);
    expect((size.inputs['T_wall'] as Q).value).toBe(866);
    const W = load.outputs['relief_load'] as Q;
    expect((size.outputs['relief_load'] as Q).value).toBeCloseTo(W.value, 9);
  });
});
