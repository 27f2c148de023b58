/* Method c.rated-capacity: what a valve passes of a liquid by its actual area and certified coefficient. */
import { type Method } from '../../catalog/types';
import { convert, fromSI, toSI, unitLabel } from '../../quantity';
import { type SheetBuilder, workSheet } from '../../sheet';
import { input, optional, output, RELIEVING_INPUTS } from '../common/describe';
import { absoluteIn, barometerIn, relievingAbsolute } from '../common/pressures';
import { SYSTEM_UNITS, systemOf } from '../common/system';
import { KV_FORMULAS, type KvFormula, liquidKv, WATER_DENSITY } from './flow';

const CLAUSE = 'orifice equation; basis of API 520-1 and of the ASME capacity formula for water';

/**
 * Flow of a liquid and its viscosity factor: W = K A Kv √(2 ρ Δp), Kv at the Reynolds number of the flow itself by the constant
 * of API 520-1 (18 800 Q G/(μ √A); L/min, cP, mm²). SI: m², Pa, kg/m³; mu Pa·s. The iteration contracts; 200 rounds at most.
 */
export function ratedLiquid(
  KA: number,
  A: number,
  drive: { dp: number; rho: number; mu?: number },
  formula: KvFormula,
): { W: number; Kv: number; Re?: number } {
  const { dp, rho, mu } = drive;
  const free = KA * Math.sqrt(2 * rho * dp);
  if (mu === undefined) return { W: free, Kv: 1 };
  const reynolds = (W: number) =>
    (18800 * ((W / rho) * 60000) * (rho / WATER_DENSITY)) / (mu * 1e3 * Math.sqrt(A * 1e6));
  let Kv = 1;
  for (let round = 0; round < 200; round += 1) {
    const next = liquidKv(reynolds(free * Kv), formula);
    const off = Math.abs(next - Kv);
    Kv = next;
    if (off <= 1e-13 * Kv) break;
  }
  return { W: free * Kv, Kv, Re: reynolds(free * Kv) };
}

type Driven = { dp: number; rho: number; mu?: number };

/** Pressures and liquid, in Pa, kg/m³ and Pa·s. */
function readDrive(sheet: SheetBuilder, system: 'SI' | 'US'): Driven {
  const unit = SYSTEM_UNITS[system].P;
  const P1 = convert({ value: relievingAbsolute(sheet, system), unit }, 'Pa_abs');
  const back = sheet.has('P2')
    ? absoluteIn(sheet, 'P2', 'P_2', unit)
    : sheet.keep('P2', barometerIn(sheet, unit), 'P_2');
  const P2 = convert({ value: back, unit }, 'Pa_abs');
  if (P2 >= P1)
    sheet.refuse('NO_FLOW', 'P2', 'The relieving pressure is not above the back pressure: nothing can flow.');
  const rho = sheet.number('rho', 'kg/m3', { above: 0 }, '\\rho');
  const mu = sheet.has('mu')
    ? toSI({ value: sheet.number('mu', 'cP', { above: 0 }, '\\mu'), unit: 'cP' })
    : undefined;
  sheet.step(
    { key: 'dp', tex: '\\Delta p', meaning: 'pressure that drives the flow', value: P1 - P2, unit: 'Pa' },
    (v) => `${unit === 'psia' ? '6894.757' : '10^3'} \\, (${v('P1')} - ${v('P2')})`,
  );
  return { dp: P1 - P2, rho, ...(mu === undefined ? {} : { mu }) };
}

/** The Reynolds number and the factor of a viscous liquid. */
function viscositySteps(sheet: SheetBuilder, found: { Kv: number; Re?: number }, formula: KvFormula): void {
  if (found.Re === undefined) return;
  sheet.step(
    {
      key: 'Re',
      meaning: 'Reynolds number at the rated flow',
      value: found.Re,
      unit: '-',
      clause: 'API 520-1, viscosity',
      memory: true,
    },
    (v) =>
      `\\frac{18\\,800 \\cdot 60\\,000 \\cdot W_{rated}}{${WATER_DENSITY} \\cdot ${v('mu')} \\sqrt{10^6 \\, ${v('A_actual')}}}`,
  );
  sheet.step(
    {
      key: 'Kv',
      tex: 'K_v',
      meaning: `viscosity factor, ${formula} formula`,
      value: found.Kv,
      unit: '-',
      clause: 'API 520-1, Kv',
      memory: true,
    },
    (v) =>
      formula === '10E'
        ? `\\left(1 + \\frac{170}{${v('Re')}}\\right)^{-0.5}`
        : `\\min\\left(1,\\ \\left(0.9935 + \\frac{2.878}{${v('Re')}^{0.5}} + \\frac{342.75}{${v('Re')}^{1.5}}\\right)^{-1}\\right)`,
  );
}

/** c.rated-capacity: rated capacity in liquid service. */
export const RATED_LIQUID: Method = {
  id: 'c.rated-capacity',
  version: 1,
  topic: 'c.rated-capacity',
  title: 'Rated capacity on a liquid from actual area and certified coefficient',
  editions: ['API 520-1, 7th to 10th edition'],
  source:
    'Orifice equation W = K A √(2 ρ Δp), basis of API 520-1, EN ISO 4126-1 and the ASME capacity formula for water (clauses from memory); viscosity factor of API 520-1',
  validity:
    'Liquid that does not flash, valve certified for liquid. Actual area with the certified coefficient only. A valve of proportional lift passes this at its full lift.',
  inputs: [
    input('A_actual', 'actual flow area', 'area', { rangeKey: 'orificeArea' }),
    input('K_certified', 'certified coefficient of discharge for liquid', 'dimensionless'),
    input('rho', 'density', 'density'),
    optional('mu', 'viscosity', 'viscosity'),
    ...RELIEVING_INPUTS,
    optional('P2', 'total back pressure (the barometric pressure when not given)', 'pressure-absolute'),
    optional('Kw', 'back-pressure factor of a balanced valve (1 when not given)', 'dimensionless'),
    optional('Kc', 'combination factor with a rupture disk (1 when not given)', 'dimensionless', {
      rangeKey: 'kc',
    }),
    optional(
      'Kv_formula',
      'formula of the viscosity factor (that of the 10th edition when not given)',
      undefined,
      {
        words: [...KV_FORMULAS],
      },
    ),
  ],
  outputs: [
    output('P1', 'relieving pressure', 'pressure-absolute'),
    output('Re', 'Reynolds number at the rated flow', 'dimensionless'),
    output('Kv', 'viscosity factor', 'dimensionless'),
    output('W_rated', 'rated capacity', 'mass-flow'),
  ],
  work(inputs, edition) {
    return workSheet(this, inputs, edition, (sheet) => {
      const system = systemOf(inputs, ['A_actual']);
      const u = SYSTEM_UNITS[system];
      const A = sheet.number('A_actual', 'm2', { above: 0 }, 'A');
      const K = sheet.number('K_certified', '-', { above: 0, max: 1 }, 'K');
      const Kw = sheet.number('Kw', '-', { above: 0, max: 1, fallback: 1 }, 'K_w');
      const Kc = sheet.number('Kc', '-', { above: 0, max: 1, fallback: 1 }, 'K_c');
      const formula = sheet.word('Kv_formula', KV_FORMULAS, '10E');
      const found = ratedLiquid(K * A * Kw * Kc, A, readDrive(sheet, system), formula);
      viscositySteps(sheet, found, formula);
      sheet.keep('Kv', found.Kv, 'K_v');
      const W = fromSI(found.W, u.W).value;
      sheet.step(
        { key: 'W', tex: 'W_{rated}', meaning: 'rated capacity', value: W, unit: u.W, clause: CLAUSE },
        (v) =>
          `${['K_certified', 'A_actual', 'Kw', 'Kc', 'Kv'].map((name) => v(name)).join(' \\cdot ')} \\sqrt{2 \\, ${v('rho')} \\cdot ${v('dp')}} \\quad (\\text{kg/s, shown as } ${unitLabel(u.W)})`,
      );
      if (found.Re !== undefined) sheet.output('Re', found.Re);
      sheet.output('Kv', found.Kv);
      sheet.output('W_rated', W, u.W);
    });
  },
};
