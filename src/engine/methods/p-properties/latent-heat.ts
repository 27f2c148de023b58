/* Method p.latent-heat: boiling range and latent heat of a liquid at relieving pressure. */
import { type Method } from '../../catalog/types';
import { type Boundary, type CubicFluid } from '../../fluids';
import { at } from '../../fluids/cubic/vector';
import { type SheetBuilder, workSheet } from '../../sheet';
import { GAS_CONSTANT } from '../a-gas/flow';
import { optional, output, RELIEVING_INPUTS } from '../common/describe';
import { relievingAbsolute } from '../common/pressures';
import { LATENT_FLOOR } from '../f-loads/latent';
import { type Figure, FLUID_INPUTS, ownGovern, readWorked, settle, type Worked } from './fluid';

const LATENT: Figure = { name: 'latent_heat', meaning: 'latent heat', tex: '\\lambda', unit: 'kJ/kg' };
const BUBBLE: Figure = { name: 'bubble_temperature', meaning: 'boiling temperature', tex: 'T_b', unit: 'K' };

/** Substances whose latent heat the equation gives 3 to 7 % too great, as found against reference equations of state. */
const LATENT_HIGH = [
  'methanol',
  'acetone',
  'ammonia',
  'propyne',
  'hydrogen chloride',
  'methyl chloride',
  'R-32',
  'water',
];

/** Warns of substances whose latent heat comes out too great, and with it the load too small. */
export function warnLatentHigh(sheet: SheetBuilder, { cubic }: Worked): void {
  const named =
    cubic?.mixture.substances.filter((s) => LATENT_HIGH.includes(s.name)).map((s) => s.name) ?? [];
  if (named.length > 0)
    sheet.warn(
      'LATENT_HEAT_HIGH',
      `Of ${named.join(', ')} the equation gives a latent heat 3 to 7 % too great, so that a load from it is as much too small: take a measured one where it matters.`,
    );
}

/** Refuses a pressure at which the liquid has no bubble point. */
export function noBubble(sheet: SheetBuilder, { source, cubic }: Worked, P: number): never {
  const kPa = (p: number) => `${(p / 1000).toPrecision(4)} kPa`;
  if (P >= source.critical.P && source.pure)
    return sheet.refuse(
      'SUPERCRITICAL',
      'P1',
      `At ${kPa(P)} ${source.name} has no latent heat: its critical pressure is ${kPa(source.critical.P)}. Work the contents as a supercritical fluid (e.fire-supercritical).`,
    );
  const range = cubic ? ` between ${cubic.range.low.toFixed(0)} and ${cubic.range.high.toFixed(0)} K` : '';
  return sheet.refuse(
    'NO_BUBBLE_POINT',
    'P1',
    `At ${kPa(P)} ${source.name} has no bubble point${range}: either the pressure is above its critical region, or it holds a gas that does not condense there. Leave out the gas, or work it as a supercritical fluid (e.fire-supercritical).`,
  );
}

/** Bubble and dew of the fluid at P; water has both at its one boiling point. */
function ends(sheet: SheetBuilder, worked: Worked, P: number): { bubble: Boundary; dew?: Boundary } {
  const { source, cubic } = worked;
  if (cubic) {
    const bubble = cubic.boundary(P, 'bubble') ?? noBubble(sheet, worked, P);
    const dew = source.pure ? bubble : cubic.boundary(P, 'dew');
    return dew ? { bubble, dew } : { bubble };
  }
  const sat = source.saturation(P) ?? noBubble(sheet, worked, P);
  const both = { T: sat.liquid.T, ...sat, x: [1], y: [1] };
  return { bubble: both, dew: both };
}

/** The vapour that forms first, its composition by the line. */
function vapourLines(sheet: SheetBuilder, cubic: CubicFluid | undefined, bubble: Boundary, P: number): void {
  const { substances, n } = cubic?.mixture ?? { substances: [], n: 1 };
  if (n > 1)
    substances.forEach((s, i) => {
      sheet.step(
        {
          key: `y_${i}`,
          tex: `y_{${i + 1}}`,
          meaning: `mole fraction of ${s.name} in the first vapour`,
          value: at(bubble.y, i),
          unit: '-',
        },
        () => `z_{${i + 1}} \\frac{\\varphi_{${i + 1}}^l}{\\varphi_{${i + 1}}^v}`,
      );
    });
  const M = n > 1 ? substances.reduce((sum, s, i) => sum + s.M[0] * at(bubble.y, i), 0) : undefined;
  const molar = M ?? substances[0]?.M[0] ?? 18.015257;
  sheet.output('vapour_M', molar, 'kg/kmol');
  sheet.output('vapour_density', bubble.vapour.rho, 'kg/m3');
  sheet.output('vapour_Z', (P * molar) / (bubble.vapour.rho * GAS_CONSTANT * bubble.T));
  sheet.output('liquid_density', bubble.liquid.rho, 'kg/m3');
}

/** Steps of the fluid worked here; gives boiling temperature (K) and latent heat (kJ/kg). */
function workedLines(sheet: SheetBuilder, worked: Worked, P: number): { T: number; latent: number } {
  const clause = worked.source.source;
  const { bubble, dew } = ends(sheet, worked, P);
  sheet.step(
    {
      key: 'Tb',
      tex: 'T_b',
      meaning: 'bubble point at relieving pressure',
      value: bubble.T,
      unit: 'K',
      clause,
    },
    () => '\\text{root of } \\sum_i z_i \\frac{\\varphi_i^l}{\\varphi_i^v} = 1',
  );
  if (dew) {
    sheet.step(
      { key: 'Td', tex: 'T_d', meaning: 'dew point at relieving pressure', value: dew.T, unit: 'K', clause },
      () => '\\text{root of } \\sum_i z_i \\frac{\\varphi_i^v}{\\varphi_i^l} = 1',
    );
    sheet.output('dew_temperature', dew.T, 'K');
  }
  vapourLines(sheet, worked.cubic, bubble, P);
  const enthalpy = (key: string, tex: string, meaning: string, h: number) =>
    sheet.step({ key, tex, meaning, value: h / 1e3, unit: 'kJ/kg', clause }, () => 'h^0 + h^{res}');
  enthalpy('h_v', 'h_v', 'enthalpy of the first vapour', bubble.vapour.h);
  enthalpy('h_l', 'h_l', 'enthalpy of the boiling liquid', bubble.liquid.h);
  const latent = sheet.step(
    {
      key: 'lambda',
      tex: '\\lambda',
      meaning: 'latent heat at relieving pressure: first vapour less boiling liquid, at one temperature',
      value: (bubble.vapour.h - bubble.liquid.h) / 1e3,
      unit: 'kJ/kg',
    },
    (v) => `${v('h_v')} - ${v('h_l')}`,
  );
  if (dew && !worked.source.pure) {
    enthalpy('h_d', 'h_d', 'enthalpy of the whole as vapour at its dew point', dew.vapour.h);
    const whole = sheet.step(
      {
        key: 'whole',
        tex: '\\lambda_{all}',
        meaning: 'heat to boil the whole away, warming included',
        value: (dew.vapour.h - bubble.liquid.h) / 1e3,
        unit: 'kJ/kg',
      },
      (v) => `${v('h_d')} - ${v('h_l')}`,
    );
    sheet.output('heat_to_dew', whole, 'kJ/kg');
    sheet.warn(
      'BOILS_OVER_A_RANGE',
      'A mixture boils over a range of temperature: the first vapour is not always the governing one. Follow the whole curve (p.boiling-curve).',
    );
  }
  return { T: bubble.T, latent };
}

/** p.latent-heat: bubble point, dew point and latent heat at relieving pressure. */
export const LATENT_HEAT: Method = {
  id: 'p.latent-heat',
  version: 1,
  topic: 'p.latent-heat',
  title: 'Boiling range and latent heat at relieving pressure',
  editions: ['Peng–Robinson 1976 with Twu alpha function and translation of volume, 2018 parameters'],
  source:
    'Equality of fugacities and difference of enthalpies by Peng and Robinson (1976) with parameters of Pina-Martinez et al. (2018); water by IAPWS-IF97',
  validity:
    'Liquids below their critical region; latent heat within about 3 % up to eight tenths of the critical temperature (methanol and acetone 7 %), less sure above.',
  inputs: [
    ...FLUID_INPUTS,
    ...RELIEVING_INPUTS,
    optional('own_latent_heat', 'own latent heat at relief', 'specific-energy', { rangeKey: 'latentHeat' }),
    optional('own_bubble_temperature', 'own boiling temperature at relief', 'temperature', {
      rangeKey: 'relievingTemperature',
    }),
  ],
  outputs: [
    output('P1', 'relieving pressure', 'pressure-absolute'),
    output('source', 'where the governing figures come from'),
    output('bubble_temperature', 'bubble point at relieving pressure', 'temperature'),
    output('dew_temperature', 'dew point at relieving pressure', 'temperature'),
    output('latent_heat', 'latent heat at relieving pressure', 'specific-energy'),
    output('heat_to_dew', 'heat to boil the whole away, warming included', 'specific-energy'),
    output('vapour_M', 'molar mass of the first vapour', 'molar-mass'),
    output('vapour_Z', 'compressibility factor of the first vapour', 'dimensionless'),
    output('vapour_density', 'density of the first vapour', 'density'),
    output('liquid_density', 'density of the boiling liquid', 'density'),
  ],
  work(inputs, edition) {
    return workSheet(this, inputs, edition, (sheet) => {
      const P = relievingAbsolute(sheet, 'SI') * 1000;
      const worked = readWorked(sheet);
      const own = ownGovern(sheet, worked);
      if ((worked === undefined || own) && !sheet.has('own_latent_heat'))
        sheet.refuse(
          'INPUT_MISSING',
          worked === undefined ? 'fluid' : 'own_latent_heat',
          'Neither a fluid nor an own latent heat governs: name the fluid (fluid), or give own_latent_heat.',
        );
      sheet.output('source', own ? 'own figures' : (worked?.source.source ?? ''));
      if (worked === undefined)
        sheet.say({
          symbol: '\\text{fluid}',
          meaning: 'own figures, not worked here',
          value: 'own figures',
          tex: '\\text{own figures}',
        });
      const found = worked && workedLines(sheet, worked, P);
      if (worked) warnLatentHigh(sheet, worked);
      settle(sheet, BUBBLE, found?.T, own);
      const latent = settle(sheet, LATENT, found?.latent, own);
      if (latent !== undefined && latent * 1000 < LATENT_FLOOR)
        sheet.warn(
          'LATENT_HEAT_LOW',
          'The latent heat is below 115 kJ/kg (50 Btu/lb), as near the critical point: W = Q/λ is doubtful there.',
          '115 kJ/kg and above',
        );
    });
  },
};
