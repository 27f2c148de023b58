/* Two-phase sizes of a basis: the fluid by name or composition, quality or temperature, absolute back pressure, Kd by phase. */
import { describe, expect, it } from 'vitest';
import { type Basis, type Fluid } from '@domain/basis';
import { type Sheet } from '@domain/evaluate';
import { workMethod } from '@engine/catalog';
import { basisWith, evaluated, first } from '../../../fixtures/basis';

const KEY = 'abnormal-heat-input';

function sized(method: string, change: (fluid: Fluid) => void): Sheet | undefined {
  const basis: Basis = basisWith((one) => {
    const found = one.scenarios.find((scenario) => scenario.key === KEY);
    const answer = first(found?.answers ?? []);
    answer.size = { by: 'method', method, inputs: {} };
    const fluid = one.fluids.find((each) => each.id === answer.fluid);
    if (fluid) change(fluid);
  });
  return evaluated(basis).sheets[`size:${KEY}/an_1`];
}

const quality = { value: 0.1, unit: '-' };

describe('a size by direct integration', () => {
  it('takes water of the document at its quality, and no temperature beside it', () => {
    const sheet = sized('d.hem-size', (fluid) => {
      fluid.from = { kind: 'water' };
      fluid.quality = quality;
    });
    expect(sheet?.refused).toBeUndefined();
    expect(sheet?.inputs).toMatchObject({ fluid: 'water', x0: quality });
    expect(sheet?.inputs['T0']).toBeUndefined();
    expect(sheet?.inputs['Kd']).toBeUndefined();
    const { P0, back_pressure, W } = sheet?.inputs ?? {};
    if (typeof P0 !== 'object' || typeof back_pressure !== 'object' || typeof W !== 'object')
      throw new Error('the size has no pressures');
    expect(back_pressure.unit).toBe('kPa_abs');
    const alone = workMethod('d.hem-size', { fluid: 'water', x0: quality, P0, back_pressure, W });
    expect(sheet?.outputs['mass_flux']).toEqual(alone.outputs['mass_flux']);
    expect(sheet?.outputs['A_required']).toEqual(alone.outputs['A_required']);
  });

  it('takes a composition in mole fractions, and says what is missing of one by mass', () => {
    const parts = [
      { id: 'pt_1', substance: 'propane', amount: { value: 60, unit: '%' } },
      { id: 'pt_2', substance: 'n-butane', amount: { value: 0.4, unit: '-' } },
    ];
    const change = (per: 'mole' | 'mass') => (fluid: Fluid) => {
      fluid.from = { kind: 'composition', parts, per };
      fluid.quality = { value: 0, unit: '-' };
    };
    const sheet = sized('d.hem-size', change('mole'));
    expect(sheet?.inputs['fluid']).toBe('propane 0.6; n-butane 0.4');
    expect(sheet?.refused).toBeUndefined();
    expect(sized('d.hem-size', change('mass'))?.refused).toMatchObject({ code: 'INPUT_MISSING' });
  });

  it('takes the coefficient of a subcooled liquid and of a gas where the method is theirs', () => {
    const kd = (method: string) => sized(method, (fluid) => (fluid.from = { kind: 'water' }))?.inputs['Kd'];
    expect(kd('d.omega-saturated')).toEqual({ value: 0.85, unit: '-' });
    expect(kd('d.omega-subcooled')).toEqual({ value: 0.65, unit: '-' });
    expect(kd('d.real-gas-size')).toEqual({ value: 0.975, unit: '-' });
  });
});
