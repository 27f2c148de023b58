/* Method p.boiling-curve: load of a boiling mixture against the fraction that has left, and the point that governs. */
import { type Method } from '../../catalog/types';
import { gasC } from '../a-gas/flow';
import { type SheetBuilder, workSheet } from '../../sheet';
import { input, optional, output, RELIEVING_INPUTS } from '../common/describe';
import { relievingAbsolute } from '../common/pressures';
import { LATENT_FLOOR } from '../f-loads/latent';
import { boilingCurve, type Stretch } from './boiling';
import { FLUID_INPUTS, readWorked } from './fluid';
import { noBubble, warnLatentHigh } from './latent-heat';

/** Stretches of the curve when none are asked for, and the most that are worked. */
const STEPS = 20;
const MOST_STEPS = 50;

/** A stretch with its load (kg/h) and the area that the load asks for against that of the first stretch. */
type Point = Stretch & { load: number; area: number };

/** Ideal-gas exponent for C, from the vapour's real ratio held within the range of the equation. */
function exponent({ vapour }: Stretch): number {
  return Math.min(1.67, Math.max(1.01, vapour.cp / vapour.cv));
}

/** W √(T Z / M) / C: the area of a critical gas flow but for what is the same at every point. */
function areaMeasure(stretch: Stretch, load: number): number {
  return (load * Math.sqrt((stretch.T * stretch.Z) / stretch.M)) / gasC(exponent(stretch), 'SI');
}

function pointsOf(stretches: readonly Stretch[], heat: number): Point[] {
  const loads = stretches.map((s) => (heat / s.heat) * 3600);
  const first = stretches[0] === undefined ? 1 : areaMeasure(stretches[0], loads[0] ?? 0);
  return stretches.map((s, i) => ({
    ...s,
    load: loads[i] ?? 0,
    area: areaMeasure(s, loads[i] ?? 0) / first,
  }));
}

/** The point with the greatest area, and the one with the greatest load. */
function governing(points: readonly Point[]): { byArea: number; byLoad: number } {
  let byArea = 0;
  let byLoad = 0;
  points.forEach((p, i) => {
    if (p.area > (points[byArea]?.area ?? 0)) byArea = i;
    if (p.load > (points[byLoad]?.load ?? 0)) byLoad = i;
  });
  return { byArea, byLoad };
}

/** One line for each point of the curve. */
function curveLines(sheet: SheetBuilder, points: readonly Point[]): void {
  points.forEach((p, i) => {
    const percent = (p.fraction * 100).toPrecision(3);
    sheet.keep(`heat_${i}`, p.heat / 1e3, '\\lambda_{eff}');
    sheet.step(
      {
        key: `W_${i}`,
        tex: `W_{${i + 1}}`,
        meaning: `load with ${percent} % vaporised: ${p.T.toFixed(2)} K, M ${p.M.toFixed(2)}, Z ${p.Z.toFixed(4)}, latent heat alone ${(p.latent / 1e3).toFixed(1)} kJ/kg, area ${p.area.toFixed(4)} of the first`,
        value: p.load,
        unit: 'kg/h',
      },
      (v) => `3.6 \\cdot \\frac{${v('Q')}}{${v(`heat_${i}`)}}`,
    );
  });
}

function outputs(sheet: SheetBuilder, points: readonly Point[]): void {
  const { byArea, byLoad } = governing(points);
  const [at, first, most] = [points[byArea], points[0], points[byLoad]];
  if (!at || !first || !most) return;
  sheet.say({
    symbol: 'j',
    meaning: 'the governing point: greatest W √(T Z/M)/C, the area of a critical gas flow',
    value: `point ${byArea + 1}, ${(at.fraction * 100).toPrecision(3)} % vaporised`,
    tex: `j = \\arg\\max_i \\frac{W_i}{C_i} \\sqrt{\\frac{T_i Z_i}{M_i}}`,
    clause: 'critical gas sizing, API 520-1',
  });
  sheet.output('governing_fraction', at.fraction);
  sheet.output('governing_load', at.load, 'kg/h');
  sheet.output('governing_temperature', at.T, 'K');
  sheet.output('governing_M', at.M, 'kg/kmol');
  sheet.output('governing_Z', at.Z);
  sheet.output('governing_cp_over_cv', at.vapour.cp / at.vapour.cv);
  sheet.output('governing_heat', at.heat / 1e3, 'kJ/kg');
  sheet.output('governing_latent_heat', at.latent / 1e3, 'kJ/kg');
  sheet.output('area_ratio_to_first', at.area);
  sheet.output('first_load', first.load, 'kg/h');
  sheet.output('greatest_load', most.load, 'kg/h');
  sheet.output('greatest_load_fraction', most.fraction);
  sheet.output('points', points.length);
  if (byArea !== 0)
    sheet.warn(
      'GOVERNS_LATER',
      `The first vapour does not govern: with ${(at.fraction * 100).toPrecision(3)} % vaporised the area is ${((at.area - 1) * 100).toFixed(0)} % greater.`,
    );
  if (byArea !== 0 && byArea === points.length - 1)
    sheet.warn(
      'GOVERNS_AT_END',
      'The last point of the curve governs: the area still rises there. Ask down to which fraction the heat can last, for the wetted area shrinks with the level, and end the curve there (last_fraction).',
    );
  if (points.some((p) => p.heat < LATENT_FLOOR))
    sheet.warn(
      'LATENT_HEAT_LOW',
      'Along the curve the heat taken by a kilogram of vapour falls below 115 kJ/kg (50 Btu/lb), as near the critical point: W = Q/λ is doubtful there.',
      '115 kJ/kg and above',
    );
}

/** p.boiling-curve: load against fraction vaporised at constant heat input. */
export const BOILING_CURVE: Method = {
  id: 'p.boiling-curve',
  version: 1,
  topic: 'p.boiling-curve',
  title: 'Boiling curve of a mixture: load against fraction vaporised',
  editions: ['Peng–Robinson 1976 with Twu alpha function and translation of volume, 2018 parameters'],
  source:
    'Differential (Rayleigh) boiling with a heat balance on each stretch; equilibrium by Peng and Robinson (1976); the governing point by the equation of critical gas flow of API Standard 520 Part I (from memory). The approach is common practice, no source',
  validity:
    'Constant relieving pressure and heat input; the vapour leaves as it forms, that above the liquid is left out; one liquid. The wetted area, and with it the heat of a fire, falls with the level: constant heat is on the safe side.',
  inputs: [
    ...FLUID_INPUTS.filter((i) => i.name === 'fluid').map((i) => ({ ...i, required: true })),
    ...RELIEVING_INPUTS,
    input('Q', 'heat input, constant', 'power', { rangeKey: 'heatInput' }),
    optional(
      'last_fraction',
      'fraction of the mass at which the curve ends (0.95 when not given)',
      'dimensionless',
    ),
    optional('steps', 'number of points (20 when not given)', 'dimensionless'),
  ],
  outputs: [
    output('P1', 'relieving pressure', 'pressure-absolute'),
    output('governing_fraction', 'fraction vaporised at the governing point', 'dimensionless'),
    output('governing_load', 'load at the governing point', 'mass-flow'),
    output('governing_temperature', 'boiling temperature at the governing point', 'temperature'),
    output('governing_M', 'molar mass of the vapour there', 'molar-mass'),
    output('governing_Z', 'compressibility factor of the vapour there', 'dimensionless'),
    output('governing_cp_over_cv', 'ratio of real specific heats of the vapour there', 'dimensionless'),
    output(
      'governing_heat',
      'heat a kilogram of vapour takes there, warming of the liquid included',
      'specific-energy',
    ),
    output('governing_latent_heat', 'latent heat by itself there', 'specific-energy'),
    output('area_ratio_to_first', 'area there against that of the first vapour', 'dimensionless'),
    output('first_load', 'load of the first vapour', 'mass-flow'),
    output('greatest_load', 'greatest load of the curve', 'mass-flow'),
    output('greatest_load_fraction', 'fraction vaporised at the greatest load', 'dimensionless'),
    output('points', 'points of the curve', 'dimensionless'),
  ],
  work(inputs, edition) {
    return workSheet(this, inputs, edition, (sheet) => {
      const P = relievingAbsolute(sheet, 'SI') * 1000;
      const heat = sheet.number('Q', 'W', { above: 0 }, 'Q');
      const last = sheet.number('last_fraction', '-', { above: 0, max: 0.99, fallback: 0.95 }, 'f');
      const steps = Math.round(sheet.number('steps', '-', { min: 2, max: MOST_STEPS, fallback: STEPS }, 'N'));
      const worked =
        readWorked(sheet) ??
        sheet.refuse(
          'INPUT_MISSING',
          'fluid',
          'The fluid is missing: write its composition, such as "propane 0.6; n-butane 0.4".',
        );
      const { cubic } = worked;
      if (!cubic)
        return sheet.refuse(
          'ONE_SUBSTANCE',
          'fluid',
          'Water boils at one temperature: there is no curve. Take its latent heat (p.latent-heat).',
        );
      warnLatentHigh(sheet, worked);
      const { substances, z } = cubic.mixture;
      const { stretches, ended } = boilingCurve(substances, [...z], P, steps, last);
      if (stretches.length === 0) noBubble(sheet, worked, P);
      if (ended)
        sheet.warn(
          'CURVE_ENDS',
          `The curve ends with ${(ended.fraction * 100).toPrecision(3)} % vaporised: what is left has no bubble point at this pressure within the data. Beyond, work the rest by hand or as a supercritical fluid.`,
        );
      const points = pointsOf(stretches, heat);
      curveLines(sheet, points);
      return outputs(sheet, points);
    });
  },
};
