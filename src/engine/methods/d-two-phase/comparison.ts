/* Method d.comparison: one inlet by several methods on one sheet, so that a reader sees how far they part and why. */
import { type Method } from '../../catalog/types';
import { type SheetBuilder, texNumber, workSheet } from '../../sheet';
import { optional, output } from '../common/describe';
import { SYSTEM_UNITS, type System, systemOf } from '../common/system';
import { FACTOR_INPUTS, FLUX_UNITS, OMEGA_CLAUSE, PRESSURE_INPUTS } from './common';
import { compareFluxes, type Fluxes, type Way, WAYS } from './compare-rows';
import { defaultKd, FLUID_INPUTS, readFluid, readInlet } from './fluid';
import { HEM_CLAUSE, inletSteps } from './hem-steps';
import { pressuresInPa } from './hem-nozzle';
import { inSI, warnCritical, warnShortNozzle } from './warnings';

type Words = { symbol: string; meaning: string; how: string; clause: string };

const WORDS: Record<Way, Words> = {
  integration: {
    symbol: 'G_{int}',
    meaning: 'mass flux by integration along the isentrope (equilibrium)',
    how: '\\max_P\\ \\rho(P, s_0) \\sqrt{2(h_0 - h(P, s_0))}',
    clause: HEM_CLAUSE,
  },
  omega_volumes: {
    symbol: 'G_{\\omega 9}',
    meaning: 'mass flux by omega from the volume at 90 %',
    how: 'G(\\omega = 9(v_9/v_0 - 1))',
    clause: OMEGA_CLAUSE,
  },
  omega_properties: {
    symbol: 'G_{\\omega p}',
    meaning: 'mass flux by omega from inlet properties',
    how: 'G(\\omega(x_0, v_v, v_l, c_p, T_0, \\lambda))',
    clause: OMEGA_CLAUSE,
  },
  delayed_boiling: {
    symbol: 'G_N',
    meaning: 'mass flux with the delay of boiling in a safety valve',
    how: 'G(\\omega_N),\\ a = 0.4',
    clause: 'ISO 4126-10; Diener and Schmidt 2004',
  },
  no_flashing: {
    symbol: 'G_f',
    meaning: 'mass flux if nothing flashed (frozen quality)',
    how: 'G(\\omega = \\alpha_0/k)',
    clause: OMEGA_CLAUSE,
  },
  ideal_gas: {
    symbol: 'G_{ideal}',
    meaning: 'mass flux by the ideal formula with Z and real cp/cv',
    how: 'G_{ideal}(P_0, T_0, Z, c_p/c_v)',
    clause: 'API 520-1, isentropic nozzle of an ideal gas',
  },
  all_vapour: {
    symbol: 'G_v',
    meaning: 'bound: saturated vapour alone at the inlet pressure',
    how: '\\max_P\\ \\rho(P, s_v) \\sqrt{2(h_v - h(P, s_v))}',
    clause: HEM_CLAUSE,
  },
  all_liquid: {
    symbol: 'G_l',
    meaning: 'bound: liquid alone, not flashing',
    how: '\\sqrt{2 \\rho_l (P_0 - P_b)}',
    clause: 'Bernoulli, liquid of constant density',
  },
};

/** Ways that claim to predict the flux, whose spread is judged; the others are bounds. */
const PREDICTIONS: readonly Way[] = ['omega_volumes', 'omega_properties'];
/** Difference between omega and integration that calls for a reason: common practice, no source. */
const SPREAD = 0.15;

/** One way: its flux, how far from the integration, and the area where a load is given. */
function waySteps(
  sheet: SheetBuilder,
  way: Way,
  fluxes: Fluxes,
  area?: { constant: number; unit: string; per: number },
): void {
  const flux = fluxes[way];
  if (flux === undefined) return;
  const { symbol, meaning, how, clause } = WORDS[way];
  sheet.step({ key: symbol, tex: symbol, meaning, value: flux, unit: 'kg/(m2.s)', clause }, () => how);
  sheet.output(`flux_${way}`, flux, 'kg/(m2.s)');
  if (way !== 'integration' && fluxes.integration) {
    const off = sheet.step(
      {
        key: `d ${way}`,
        tex: `\\Delta_{${symbol}}`,
        meaning: 'difference from the integration',
        value: 100 * (flux / fluxes.integration - 1),
        unit: '%',
      },
      (v) => `100 \\left(\\frac{${v(symbol)}}{${v('G_{int}')}} - 1\\right)`,
    );
    sheet.output(`difference_${way}`, off, '%');
  }
  if (!area || flux <= 0) return;
  const value = area.constant / (flux * area.per);
  sheet.step(
    {
      key: `A ${way}`,
      tex: `A_{${symbol}}`,
      meaning: 'required effective area by it',
      value,
      unit: area.unit,
    },
    (v) => `\\frac{${texNumber(area.constant)}}{${v(symbol)} \\cdot ${texNumber(area.per)}}`,
  );
  sheet.output(`area_${way}`, value, area.unit);
}

/** The constant W/(Kd Kb Kc Kv) of the area, when a load is given. */
function areaBy(sheet: SheetBuilder, system: System, Kd: number) {
  if (!sheet.has('W')) return undefined;
  const factor = (name: string, tex: string, fallback: number) =>
    sheet.number(name, '-', { above: 0, max: 1, fallback }, tex);
  const factors =
    factor('Kd', 'K_d', Kd) * factor('Kb', 'K_b', 1) * factor('Kc', 'K_c', 1) * factor('Kv', 'K_v', 1);
  const W = sheet.number('W', SYSTEM_UNITS[system].W, { above: 0 });
  const constant = (FLUX_UNITS[system].area * W) / factors;
  sheet.step(
    { key: 'W/K', tex: 'w', meaning: 'load over the factors of the area', value: constant, unit: '-' },
    (v) =>
      `\\frac{${texNumber(FLUX_UNITS[system].area)} \\cdot ${v('W')}}{${v('Kd')} \\cdot ${v('Kb')} \\cdot ${v('Kc')} \\cdot ${v('Kv')}}`,
  );
  return { constant, unit: SYSTEM_UNITS[system].A, per: inSI(1, 'kg/(m2.s)', FLUX_UNITS[system].G) };
}

function warnSpread(sheet: SheetBuilder, fluxes: Fluxes): void {
  const reference = fluxes.integration;
  if (reference === undefined) {
    sheet.warn(
      'NO_INTEGRATION',
      'The properties of the fluid end before a throat is found on the isentrope; only the other methods stand.',
    );
    return;
  }
  for (const way of PREDICTIONS) {
    const off = (fluxes[way] ?? reference) / reference - 1;
    if (Number.isFinite(off) && Math.abs(off) > SPREAD)
      sheet.warn(
        'METHODS_DIFFER',
        `${WORDS[way].meaning}: ${Math.abs(off * 100).toFixed(0)} % ${off > 0 ? 'above' : 'below'} the integration. Say in the basis why one is preferred.`,
        'within 15 %',
      );
  }
}

const each = (name: string, meaning: string, dimension: 'mass-flux' | 'dimensionless' | 'area') =>
  WAYS.map((way) => output(`${name}_${way}`, `${meaning}: ${WORDS[way].meaning}`, dimension));

/** d.comparison: omega in its forms, integration and bounds on the same inlet. */
export const COMPARISON: Method = {
  id: 'd.comparison',
  version: 1,
  topic: 'd.comparison',
  title: 'Two-phase inlet: methods held against each other',
  editions: ['API 520-1, 7th to 10th edition'],
  source:
    'API Standard 520 Part I Annex B and C; ISO 4126-10 after Diener and Schmidt 2004 for delayed boiling; from memory; properties as the sheet names them',
  validity:
    'A comparison, not a sizing: each method within its own range; bounds are no predictions; all without friction.',
  inputs: [
    ...FLUID_INPUTS,
    ...PRESSURE_INPUTS,
    optional('W', 'required relief load, for areas', 'mass-flow', { rangeKey: 'reliefLoad' }),
    ...FACTOR_INPUTS,
    optional('nozzle_length', 'flow length of the nozzle', 'length'),
  ],
  outputs: [
    output('P1', 'relieving pressure', 'pressure-absolute'),
    output('inlet_density', 'density at the inlet', 'density'),
    output('inlet_temperature', 'temperature at the inlet', 'temperature'),
    ...each('flux', 'mass flux', 'mass-flux'),
    ...each('difference', 'difference from the integration', 'dimensionless'),
    ...each('area', 'required effective area', 'area'),
  ],
  work(inputs, edition) {
    return workSheet(this, inputs, edition, (sheet) => {
      const system = systemOf(inputs, ['W', 'P0', 'set_pressure']);
      const { P0, Pb } = pressuresInPa(sheet, system);
      const source = readFluid(sheet);
      const inlet = readInlet(sheet, source, P0);
      inletSteps(sheet, source, inlet);
      const area = areaBy(sheet, system, defaultKd(inlet));
      const fluxes = compareFluxes(source, inlet, Pb);
      for (const way of WAYS) waySteps(sheet, way, fluxes, area);
      if (Object.keys(fluxes).length === 0)
        sheet.refuse(
          'OUTSIDE_FORMULATION',
          'fluid',
          `No method can work ${source.name} at this inlet: its properties end there (${source.source}).`,
        );
      warnSpread(sheet, fluxes);
      warnCritical(sheet, { T: inlet.state.T / source.critical.T, P: P0 / source.critical.P });
      if (inlet.phase !== 'vapour' && inlet.phase !== 'supercritical') warnShortNozzle(sheet);
    });
  },
};
