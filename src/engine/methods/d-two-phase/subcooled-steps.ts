/* The steps of a subcooled inlet on a sheet: region, critical pressure and mass flux. */
import { type SheetBuilder } from '../../sheet';
import { SYSTEM_UNITS, type System } from '../common/system';
import { FLUX_UNITS, OMEGA_CLAUSE } from './common';
import { type SubcooledFlow } from './omega';
import { inSI } from './warnings';

/** Everything the steps after the reading need: pressures in the system's unit, the flow in coherent SI. */
export type SubcooledCase = { system: System; P0: number; Pb: number; Ps: number; flow: SubcooledFlow };

/** Low or high subcooling, and the critical pressure that belongs to it. */
export function regionSteps(sheet: SheetBuilder, { system, P0, Ps, flow }: SubcooledCase): void {
  const region = flow.low ? 'low subcooling' : 'high subcooling';
  sheet.output('region', region);
  sheet.say({
    symbol: '\\text{region}',
    meaning: flow.low
      ? 'the liquid flashes ahead of the throat'
      : 'the liquid flashes at the throat, or not at all',
    value: region,
    tex: `P_s ${flow.low ? '>' : '\\le'} \\eta_{st} \\cdot P_0`,
    clause: OMEGA_CLAUSE,
  });
  const unit = SYSTEM_UNITS[system].P;
  const info = {
    key: 'Pcf',
    tex: 'P_c',
    meaning: 'critical pressure',
    unit,
    value: flow.ratio * P0,
    clause: OMEGA_CLAUSE,
  };
  if (flow.low) {
    lowRatioSteps(sheet, Ps / P0, flow.ratio);
    sheet.step(info, (v) => `${v('eta_c')} \\cdot ${v('P0')}`);
  } else sheet.step(info, (v) => v('Ps'));
  sheet.output('critical_pressure', flow.ratio * P0, unit);
}

function lowRatioSteps(sheet: SheetBuilder, etaS: number, ratio: number): void {
  sheet.step(
    {
      key: 'eta_s',
      tex: '\\eta_s',
      meaning: 'saturation pressure over inlet pressure',
      value: etaS,
      unit: '-',
    },
    (v) => `\\frac{${v('Ps')}}{${v('P0')}}`,
  );
  sheet.step(
    {
      key: 'eta_c',
      tex: '\\eta_c',
      meaning: 'critical pressure ratio',
      value: ratio,
      unit: '-',
      clause: OMEGA_CLAUSE,
      memory: true,
    },
    (v) =>
      `\\text{root of } \\frac{${v('omega_s')} + \\frac{1}{${v('omega_s')}} - 2}{2 \\cdot ${v('eta_s')}} \\eta^2 - 2(${v('omega_s')} - 1)\\eta + ${v('omega_s')} \\cdot ${v('eta_s')} \\ln\\frac{\\eta}{${v('eta_s')}} + \\frac{3}{2} \\cdot ${v('omega_s')} \\cdot ${v('eta_s')} - 1 = 0`,
  );
}

/** The mass flux: all liquid down to the throat, or flashing ahead of it. */
export function fluxStep(sheet: SheetBuilder, { system, P0, Pb, Ps, flow }: SubcooledCase): number {
  const units = FLUX_UNITS[system];
  sheet.keep('c', units.P, String(Math.round(units.P * 10) / 10));
  const info = {
    key: 'G',
    meaning: 'mass flux',
    value: inSI(flow.flux, 'kg/(m2.s)', units.G),
    unit: units.G,
    clause: OMEGA_CLAUSE,
  };
  const throat = flow.critical ? flow.ratio * P0 : Pb;
  const back = flow.critical ? 'Pcf' : 'back_pressure';
  if (throat >= Ps)
    return sheet.step(
      info,
      (v) => `\\sqrt{2 \\cdot ${v('c')} \\cdot ${v('rho0')} (${v('P0')} - ${v(back)})}`,
    );
  const eta = flow.critical ? 'eta_c' : 'eta_a';
  if (!flow.critical)
    sheet.step(
      {
        key: 'eta_a',
        tex: '\\eta_a',
        meaning: 'back pressure over inlet pressure',
        value: Pb / P0,
        unit: '-',
      },
      (v) => `\\frac{${v('back_pressure')}}{${v('P0')}}`,
    );
  return sheet.step(
    info,
    (v) =>
      `\\frac{\\sqrt{2(1 - ${v('eta_s')}) + 2\\left[${v('omega_s')} \\cdot ${v('eta_s')} \\ln\\frac{${v('eta_s')}}{${v(eta)}} - (${v('omega_s')} - 1)(${v('eta_s')} - ${v(eta)})\\right]}}{${v('omega_s')}\\left(\\frac{${v('eta_s')}}{${v(eta)}} - 1\\right) + 1} \\sqrt{${v('c')} \\cdot ${v('P0')} \\cdot ${v('rho0')}}`,
  );
}
