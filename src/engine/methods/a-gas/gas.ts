/* Method a.gas: required effective area for gas or vapour, critical and subcritical. */
import { type Method } from '../../catalog/types';
import { type SheetBuilder, texNumber, workSheet } from '../../sheet';
import { GAS_INPUTS, input, optional, output, RELIEVING_INPUTS } from '../common/describe';
import { letterStep } from '../common/letter-step';
import { absolutePressure, barometer, relievingAbsolute, shownPressure } from '../common/pressures';
import { SYSTEM_UNITS, type System, systemOf } from '../common/system';
import { criticalArea, criticalRatio, gasC, gasF2, GAS_FORMS, type GasFlow, subcriticalArea } from './flow';

const CLAUSE = 'API 520-1, sizing for gas or vapour relief';

/** Reads what the sheet needs, in the units of its system; refuses what cannot flow. */
function readGas(sheet: SheetBuilder, system: System): GasFlow {
  const u = SYSTEM_UNITS[system];
  const W = sheet.number('W', u.W, { above: 0 });
  const T = sheet.number('T', u.T, { above: 0 });
  const Z = sheet.number('Z', '-', { above: 0 });
  const M = sheet.number('M', u.M, { above: 0 });
  const k = sheet.number('k', '-', { min: 1 });
  const P1 = relievingAbsolute(sheet, system);
  const P2 = sheet.has('P2')
    ? absolutePressure(sheet, 'P2', 'P_2', system)
    : sheet.keep('P2', barometer(sheet, system), 'P_2');
  if (P2 >= P1) {
    const relation = P2 === P1 ? 'equals' : 'is below';
    sheet.refuse(
      'NO_FLOW',
      'P2',
      `Relieving pressure ${shownPressure(sheet, 'P1', P1, u.P)} ${relation} the back pressure ${shownPressure(sheet, 'P2', P2, u.P)}: nothing can flow.`,
    );
  }
  const factor = (name: string, tex: string, fallback: number) =>
    sheet.number(name, '-', { above: 0, max: 1, fallback }, tex);
  return {
    W,
    T,
    Z,
    M,
    k,
    P1,
    P2,
    Kd: factor('Kd', 'K_d', 0.975),
    Kb: factor('Kb', 'K_b', 1),
    Kc: factor('Kc', 'K_c', 1),
  };
}

/** The critical pressure and the regime it means. */
function regimeStep(sheet: SheetBuilder, gas: GasFlow, system: System): boolean {
  const u = SYSTEM_UNITS[system];
  const pressure = sheet.step(
    {
      key: 'Pcf',
      tex: 'P_{cf}',
      meaning: 'critical flow pressure',
      value: criticalRatio(gas.k) * gas.P1,
      unit: u.P,
      clause: CLAUSE,
    },
    (v) => `${v('P1')} \\left(\\frac{2}{${v('k')}+1}\\right)^{${v('k')}/(${v('k')}-1)}`,
  );
  const critical = gas.P2 <= pressure;
  sheet.output('critical_pressure', pressure, u.P);
  sheet.output('regime', critical ? 'critical' : 'subcritical');
  sheet.say({
    symbol: '\\text{regime}',
    meaning: 'flow regime at the nozzle',
    value: critical ? 'critical' : 'subcritical',
    tex: `P_2 = ${texNumber(gas.P2)} ${critical ? '\\le' : '>'} P_{cf} = ${texNumber(pressure)}`,
    clause: CLAUSE,
  });
  return critical;
}

function criticalSteps(sheet: SheetBuilder, gas: GasFlow, system: System): number {
  const u = SYSTEM_UNITS[system];
  const C = gasC(gas.k, system);
  sheet.keep('c', GAS_FORMS[system].c, texNumber(GAS_FORMS[system].c));
  sheet.step(
    {
      key: 'C',
      meaning: 'coefficient of the ratio of specific heats',
      value: C,
      unit: u.C,
      clause: CLAUSE,
      memory: true,
    },
    (v) => `${v('c')} \\sqrt{${v('k')} \\left(\\frac{2}{${v('k')}+1}\\right)^{(${v('k')}+1)/(${v('k')}-1)}}`,
  );
  sheet.output('C', C, u.C);
  return sheet.step(
    {
      key: 'A',
      meaning: 'required effective area',
      value: criticalArea(gas, system),
      unit: u.A,
      clause: CLAUSE,
    },
    (v) =>
      `\\frac{${v('W')}}{${v('C')} \\cdot ${v('Kd')} \\cdot ${v('P1')} \\cdot ${v('Kb')} \\cdot ${v('Kc')}} \\sqrt{\\frac{${v('T')} \\cdot ${v('Z')}}{${v('M')}}}`,
  );
}

function subcriticalSteps(sheet: SheetBuilder, gas: GasFlow, system: System): number {
  const u = SYSTEM_UNITS[system];
  const r = sheet.step(
    {
      key: 'r',
      meaning: 'ratio of back pressure to relieving pressure',
      value: gas.P2 / gas.P1,
      unit: '-',
      clause: CLAUSE,
    },
    (v) => `\\frac{${v('P2')}}{${v('P1')}}`,
  );
  const F2 = sheet.step(
    {
      key: 'F2',
      tex: 'F_2',
      meaning: 'coefficient of subcritical flow',
      value: gasF2(gas.k, r),
      unit: '-',
      clause: CLAUSE,
    },
    (v) =>
      `\\sqrt{\\frac{${v('k')}}{${v('k')}-1} \\, ${v('r')}^{2/${v('k')}} \\, \\frac{1-${v('r')}^{(${v('k')}-1)/${v('k')}}}{1-${v('r')}}}`,
  );
  sheet.output('F2', F2);
  const front = system === 'SI' ? (w: string) => `17.9 \\cdot ${w}` : (w: string) => w;
  const under = system === 'SI' ? '' : '735 \\cdot ';
  return sheet.step(
    {
      key: 'A',
      meaning: 'required effective area',
      value: subcriticalArea(gas, system),
      unit: u.A,
      clause: CLAUSE,
      memory: true,
    },
    (v) =>
      `\\frac{${front(v('W'))}}{${under}${v('F2')} \\cdot ${v('Kd')} \\cdot ${v('Kc')}} \\sqrt{\\frac{${v('T')} \\cdot ${v('Z')}}{${v('M')} \\cdot ${v('P1')} \\cdot (${v('P1')} - ${v('P2')})}}`,
  );
}

/** Warnings about inputs that leave the range in which the equations are good. */
function warnGas(sheet: SheetBuilder, gas: GasFlow): void {
  if (gas.Z < 0.8 || gas.Z > 1.1)
    sheet.warn(
      'Z_OUTSIDE_RANGE',
      `Z = ${gas.Z} is outside 0.8 to 1.1: the ideal-gas nozzle may be wrong; use real-gas properties.`,
      '0.8 to 1.1',
    );
}

/** a.gas: required effective area of a gas or vapour by API 520-1. */
export const GAS: Method = {
  id: 'a.gas',
  version: 1,
  topic: 'a.gas',
  title: 'Gas or vapour: required effective area',
  editions: ['API 520-1, 7th to 10th edition'],
  source:
    'API Standard 520 Part I, equations for critical and subcritical gas or vapour flow; constants from memory',
  validity:
    'Ideal-gas nozzle with inlet Z and ideal-gas k; Z from 0.8 to 1.1; a balanced valve takes its Kb with the critical equation.',
  inputs: [
    input('W', 'required relief load', 'mass-flow', { rangeKey: 'reliefLoad' }),
    ...GAS_INPUTS,
    ...RELIEVING_INPUTS,
    optional('P2', 'total back pressure (the barometric pressure when not given)', 'pressure-absolute'),
    optional('Kd', 'effective coefficient of discharge (0.975 when not given)', 'dimensionless', {
      rangeKey: 'kdGas',
    }),
    optional('Kb', 'back-pressure factor of a balanced valve (1 when not given)', 'dimensionless', {
      rangeKey: 'kb',
    }),
    optional('Kc', 'combination factor with a rupture disk (1 when not given)', 'dimensionless', {
      rangeKey: 'kc',
    }),
    optional(
      'balanced',
      'whether the valve is balanced, so that Kb and the critical equation apply in every regime',
    ),
  ],
  outputs: [
    output('P1', 'relieving pressure', 'pressure-absolute'),
    output('critical_pressure', 'critical flow pressure', 'pressure-absolute'),
    output('regime', 'critical or subcritical'),
    output('C', 'coefficient C', 'gas-constant-c'),
    output('F2', 'coefficient of subcritical flow', 'dimensionless'),
    output('A_required', 'required effective area', 'area'),
    output('orifice_letter', 'smallest sufficient letter'),
    output('orifice_effective_area', 'its effective area', 'area'),
  ],
  work(inputs, edition) {
    return workSheet(this, inputs, edition, (sheet) => {
      const system = systemOf(inputs, ['W', 'P1', 'set_pressure']);
      const balanced = sheet.flag('balanced', false);
      const gas = readGas(sheet, system);
      warnGas(sheet, gas);
      const critical = regimeStep(sheet, gas, system);
      if (!critical && gas.Kb < 1 && !balanced)
        sheet.refuse(
          'KB_TWICE',
          'Kb',
          'Kb belongs to a balanced valve. A conventional valve in subcritical flow takes F2 from the back pressure; set Kb to 1, or say that the valve is balanced.',
        );
      const area =
        critical || balanced ? criticalSteps(sheet, gas, system) : subcriticalSteps(sheet, gas, system);
      sheet.output('A_required', area, SYSTEM_UNITS[system].A);
      letterStep(sheet, area, system);
    });
  },
};
