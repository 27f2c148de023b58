/* Method f.control-valve-liquid: what an open control valve passes of a liquid, or the Kv it needs. */
import { type Method } from '../../catalog/types';
import { findRoot } from '../../numeric';
import { fromSI } from '../../quantity';
import { type SheetBuilder, workSheet } from '../../sheet';
import { input, optional, output } from '../common/describe';
import { absolutePressure } from '../common/pressures';
import {
  COEFFICIENTS,
  type CoefficientType,
  type Fittings,
  liquidThrough,
  REFERENCE_WATER,
  type ValveLiquid,
} from './control-valve';
import { fittingSteps, velocityTex } from './fitting-steps';
import { readCoefficient, readFittings, readPressures, readType, VALVE_INPUTS } from './valve-inputs';

const CLAUSE = 'IEC 60534-2-1:2011, incompressible fluids';

function readLiquid(sheet: SheetBuilder): ValveLiquid {
  const pressures = readPressures(sheet);
  const rho = sheet.number('rho', 'kg/m3', { above: 0 }, '\\rho');
  const Pv = absolutePressure(sheet, 'Pv', 'P_v', 'SI');
  const Pc = absolutePressure(sheet, 'Pc', 'P_c', 'SI');
  const FL = sheet.number('FL', '-', { above: 0, max: 1 }, 'F_L');
  if (Pv >= pressures.P1)
    sheet.refuse(
      'PHASE',
      'Pv',
      'The vapour pressure is not below the pressure before the valve: it is no liquid there.',
    );
  return { ...pressures, rho, Pv, Pc, FL };
}

type Through = ReturnType<typeof liquidThrough>;

function criticalStep(sheet: SheetBuilder, FF: number): void {
  sheet.step(
    {
      key: 'FF',
      tex: 'F_F',
      meaning: 'critical pressure ratio factor of the liquid',
      value: FF,
      unit: '-',
      clause: CLAUSE,
    },
    (v) => `0.96 - 0.28 \\sqrt{\\frac{${v('Pv')}}{${v('Pc')}}}`,
  );
  sheet.output('FF', FF);
}

/** The fittings and the recovery factor FLP with them. */
function recoveryStep(sheet: SheetBuilder, r: Through, type: CoefficientType, fittings: Fittings): void {
  fittingSteps(sheet, r.FP, type, fittings);
  sheet.step(
    {
      key: 'FLP',
      tex: 'F_{LP}',
      meaning: 'recovery factor with fittings',
      value: r.FLP,
      unit: '-',
      clause: CLAUSE,
      memory: true,
    },
    (v) =>
      `${v('FL')} \\left[1 + \\frac{${v('FL')}^2 \\cdot ${v('zi')}}{${COEFFICIENTS[type].N2}} ${velocityTex(v)}\\right]^{-1/2}`,
  );
  sheet.output('FLP', r.FLP);
}

/** The drop at which the valve chokes. */
function chokeStep(sheet: SheetBuilder, r: Through, fitted: boolean): void {
  sheet.step(
    {
      key: 'dpc',
      tex: '\\Delta P_{choked}',
      meaning: 'drop at which the valve chokes',
      value: r.chokedDrop,
      unit: 'kPa',
      clause: CLAUSE,
    },
    (v) =>
      `${fitted ? `\\left(\\frac{${v('FLP')}}{${v('FP')}}\\right)^2` : `${v('FL')}^2`} (${v('P1')} - ${v('FF')} \\cdot ${v('Pv')})`,
  );
  sheet.output('choked_pressure_drop', r.chokedDrop, 'kPa');
  sheet.output('choked', r.choked);
}

/** Factors and choking, then the flow. */
function flowSteps(
  sheet: SheetBuilder,
  liquid: ValveLiquid,
  C: number,
  type: CoefficientType,
  fittings: Fittings | undefined,
): void {
  const r = liquidThrough(liquid, C, type, fittings);
  criticalStep(sheet, r.FF);
  if (fittings) recoveryStep(sheet, r, type, fittings);
  chokeStep(sheet, r, fittings !== undefined);
  sheet.keep('dps', r.drop, r.choked ? '\\Delta P_{choked}' : '(P_1 - P_2)');
  sheet.keep('rho0', REFERENCE_WATER, '\\rho_0');
  sheet.step(
    {
      key: 'Q',
      meaning: `volume flow, ${r.choked ? 'choked' : 'not choked'}`,
      value: r.Q,
      unit: 'm3/h',
      clause: CLAUSE,
      memory: true,
    },
    (v) =>
      `${v('coefficient')} \\cdot ${COEFFICIENTS[type].N1} ${fittings ? `\\cdot ${v('FP')} ` : ''}\\sqrt{\\frac{${v('dps')}}{${v('rho')}/${v('rho0')}}}`,
  );
  sheet.step(
    { key: 'W', meaning: 'mass flow', value: r.Q * liquid.rho, unit: 'kg/h' },
    (v) => `${v('rho')} \\cdot ${v('Q')}`,
  );
  sheet.output('Q', r.Q, 'm3/h');
  sheet.output('W', r.Q * liquid.rho, 'kg/h');
  const unit = sheet.quantity('rho').unit.startsWith('lb') ? 'lb/h' : 'kg/h';
  sheet.output('relief_load', fromSI((r.Q * liquid.rho) / 3600, unit).value, unit);
}

function requiredSteps(
  sheet: SheetBuilder,
  liquid: ValveLiquid,
  type: CoefficientType,
  fittings: Fittings | undefined,
): void {
  const wanted = sheet.number('Q', 'm3/h', { above: 0 });
  const bare = wanted / liquidThrough(liquid, 1, type).Q;
  const search = findRoot((C) => liquidThrough(liquid, C, type, fittings).Q - wanted, bare * 0.5, bare * 5);
  if (!search.ok)
    return sheet.refuse(
      'NO_RESULT',
      'Q',
      `No coefficient passes this flow with these fittings. ${search.reason}`,
    );
  const tex = type === 'Kv' ? 'K_v' : 'C_v';
  sheet.step(
    {
      key: 'coefficient',
      tex,
      meaning:
        'coefficient that passes the flow, found by iteration; the lines below pass the flow through it',
      value: search.x,
      unit: type,
      clause: CLAUSE,
    },
    (v) => `\\text{root of } Q(${tex}) = ${v('Q')}`,
  );
  flowSteps(sheet, liquid, search.x, type, fittings);
  sheet.output('Kv_required', type === 'Kv' ? search.x : search.x * 0.865, 'm3/h');
}

/** f.control-valve-liquid: liquid through an open control valve, or the Kv that a flow needs. */
export const CONTROL_VALVE_LIQUID: Method = {
  id: 'f.control-valve-liquid',
  version: 1,
  topic: 'f.control-valve-liquid',
  title: 'Control valve failing open, liquid',
  editions: ['IEC 60534-2-1:2011'],
  source: 'IEC 60534-2-1:2011 as implemented in the open library CalebBell/fluids; N constants from memory',
  validity: 'Turbulent flow; water reference 999 kg/m³; FL of the installed trim at full travel.',
  inputs: [
    ...VALVE_INPUTS,
    input('rho', 'liquid density', 'density', { rangeKey: 'liquidDensity' }),
    input('Pv', 'vapour pressure at the valve’s temperature', 'pressure-absolute', {
      rangeKey: 'vapourPressure',
    }),
    input('Pc', 'critical pressure', 'pressure-absolute', { rangeKey: 'criticalPressure' }),
    input('FL', 'pressure recovery factor', 'dimensionless', { rangeKey: 'fL' }),
    optional('Q', 'volume flow, to find the Kv', 'volume-flow'),
  ],
  outputs: [
    output('FF', 'critical pressure ratio factor', 'dimensionless'),
    output('FP', 'piping geometry factor', 'dimensionless'),
    output('FLP', 'recovery factor with fittings', 'dimensionless'),
    output('choked_pressure_drop', 'drop at which the valve chokes', 'pressure-difference'),
    output('choked', 'whether the valve is choked'),
    output('Q', 'volume flow', 'volume-flow'),
    output('W', 'mass flow', 'mass-flow'),
    output('relief_load', 'mass flow in the site’s unit system', 'mass-flow'),
    output('Kv_required', 'Kv that passes the flow', 'volume-flow'),
  ],
  work(inputs, edition) {
    return workSheet(this, inputs, edition, (sheet) => {
      const liquid = readLiquid(sheet);
      const type = readType(sheet);
      const fittings = readFittings(sheet);
      if (!sheet.has('coefficient')) return requiredSteps(sheet, liquid, type, fittings);
      flowSteps(sheet, liquid, readCoefficient(sheet, type), type, fittings);
    });
  },
};
