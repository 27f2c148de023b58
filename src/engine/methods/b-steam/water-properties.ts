/* Method b.water-properties: properties of water and steam from two known figures, by the industrial formulation. */
import { type Method } from '../../catalog/types';
import { type FluidState } from '../../properties/types';
import { type SheetBuilder, workSheet } from '../../sheet';
import { regionOf, WATER } from '../../water';
import { MOLAR_MASS } from '../../water/constants';
import { saturationTemperature } from '../../water/saturation';
import { optional, output } from '../common/describe';
import { missingSteps, type Pair, pairOf, phaseOf, RANGE, readState } from './water-state';
import { type GibbsRegion, gibbsSteps, helmholtzSteps } from './water-steps';
import { fractionStep, mixtureSteps, saturatedSteps } from './water-two-phase';

/** Around the critical point the left-out factor of viscosity exceeds 2 % (IAPWS R12-08, from memory): K, kg/m³. */
const ENHANCED = { T: [645.91, 650.77], rho: [245.8, 405.3] } as const;

/** This close to saturation, K, a pressure and a temperature hardly tell liquid from vapour. */
const AMBIGUOUS = 0.01;

/** The sheet of a saturated or two-phase state. */
function boiling(sheet: SheetBuilder, pair: Pair, state: FluidState): void {
  const ends = WATER.saturation(state.P);
  if (ends === undefined)
    return sheet.refuse(
      'NO_SATURATION',
      'P',
      'This is too close to the critical point to tell liquid from vapour.',
    );
  const { liquid, vapour } = ends;
  saturatedSteps(sheet, liquid, vapour);
  if (!pair.includes('x')) fractionStep(sheet, pair.includes('h') ? 'h' : 's', state.x ?? 0);
  mixtureSteps(sheet, state);
  sheet.output('x', state.x ?? 0);
  sheet.output('latent_heat', (vapour.h - liquid.h) / 1e3, 'kJ/kg');
  for (const [name, phase] of [
    ['liquid', liquid],
    ['vapour', vapour],
  ] as const) {
    sheet.output(`rho_${name}`, phase.rho, 'kg/m3');
    sheet.output(`h_${name}`, phase.h / 1e3, 'kJ/kg');
    sheet.output(`cp_${name}`, phase.cp / 1e3, 'kJ/(kg.K)');
    sheet.output(`w_${name}`, phase.w, 'm/s');
    if (phase.mu !== undefined) sheet.output(`mu_${name}`, phase.mu * 1e3, 'mPa.s');
  }
}

/** Viscosity, with what the reader must know of it. */
function viscositySteps(sheet: SheetBuilder, mu: number | undefined, { T, rho }: FluidState): void {
  if (mu === undefined) {
    sheet.warn(
      'NO_VISCOSITY',
      'The viscosity is left out: the release covers it up to 1173.15 K (900 °C).',
      '273.15 to 1173.15 K',
    );
    return;
  }
  sheet.step(
    {
      key: 'mu',
      tex: '\\mu',
      meaning: 'dynamic viscosity',
      value: mu * 1e3,
      unit: 'mPa.s',
      clause: 'IAPWS R12-08, Eqs. (10) to (12), with its critical factor taken as 1',
    },
    (v) => `\\mu_0(${v('T')}) \\cdot \\mu_1(${v('T')},\\ ${v('rho')})`,
  );
  sheet.output('mu', mu * 1e3, 'mPa.s');
  if (T > ENHANCED.T[0] && T < ENHANCED.T[1] && rho > ENHANCED.rho[0] && rho < ENHANCED.rho[1])
    sheet.warn(
      'VISCOSITY_NEAR_CRITICAL',
      'So close to the critical point the viscosity is more than 2 % higher than shown: its critical factor is left out.',
      '645.91 to 650.77 K and 245.8 to 405.3 kg/m³',
    );
}

/** Superheat over the saturation temperature, and what P and T leave open beside it. */
function superheatStep(sheet: SheetBuilder, pair: Pair, state: FluidState): void {
  const boilingPoint = saturationTemperature(state.P);
  if (boilingPoint === undefined) return;
  sheet.step(
    {
      key: 'Ts',
      tex: 'T_s',
      meaning: 'saturation temperature at this pressure',
      value: boilingPoint,
      unit: 'K',
      clause: 'IAPWS R7-97(2012), Eq. (31)',
    },
    (v) => `T_s(${v('P')})`,
  );
  const superheat = sheet.step(
    {
      key: 'dT',
      tex: '\\Delta T',
      meaning: 'superheat (below nought: subcooling)',
      value: state.T - boilingPoint,
      unit: 'dK',
    },
    (v) => `${v('T')} - ${v('Ts')}`,
  );
  sheet.output('saturation_temperature', boilingPoint, 'K');
  sheet.output('superheat', superheat, 'dK');
  if (pair === 'P T' && Math.abs(superheat) < AMBIGUOUS)
    sheet.warn(
      'AT_SATURATION',
      'The temperature is that of saturation, where pressure and temperature do not tell liquid from steam: give the vapour fraction x instead.',
    );
}

/** The sheet of one phase. */
function onePhase(sheet: SheetBuilder, pair: Pair, found: FluidState): void {
  const state = WATER.atPT(found.P, found.T);
  const region = regionOf(found);
  if (state === undefined || region === undefined || region === 4)
    return sheet.refuse(
      'OUTSIDE_FORMULATION',
      'P',
      `IAPWS-IF97 holds from ${RANGE}, and not at the critical point itself.`,
    );
  superheatStep(sheet, pair, state);
  if (region === 3) helmholtzSteps(sheet, state.T, state);
  else gibbsSteps(sheet, region satisfies GibbsRegion, state.P, state.T, state);
  viscositySteps(sheet, state.mu, state);
  const Z = sheet.step(
    {
      key: 'Z',
      meaning: 'compressibility factor',
      value: (state.P / state.rho / state.T / 8314.462618) * MOLAR_MASS,
      unit: '-',
    },
    (v) => `\\frac{${v('P')} \\cdot ${v('v')}}{0.461526 \\cdot ${v('T')}}`,
  );
  const k = sheet.step(
    {
      key: 'k',
      tex: '\\kappa',
      meaning: 'ratio of specific heats of the real fluid',
      value: state.cp / state.cv,
      unit: '-',
    },
    (v) => `\\frac{${v('cp')}}{${v('cv')}}`,
  );
  const n = sheet.step(
    {
      key: 'n',
      meaning: 'isentropic exponent of the real fluid',
      value: (state.w ** 2 * state.rho) / state.P,
      unit: '-',
    },
    (v) => `\\frac{${v('w')}^2 \\cdot ${v('rho')}}{1000 \\cdot ${v('P')}}`,
  );
  sheet.output('cp', state.cp / 1e3, 'kJ/(kg.K)');
  sheet.output('cv', state.cv / 1e3, 'kJ/(kg.K)');
  sheet.output('w', state.w, 'm/s');
  sheet.output('Z', Z);
  sheet.output('cp_over_cv', k);
  sheet.output('isentropic_exponent', n);
}

/** The common outputs of both kinds of sheet. */
function outputs(sheet: SheetBuilder, state: FluidState): void {
  sheet.output('P', state.P / 1e3, 'kPa_abs');
  sheet.output('T', state.T, 'K');
  sheet.output('rho', state.rho, 'kg/m3');
  sheet.output('v', 1 / state.rho, 'm3/kg');
  sheet.output('h', state.h / 1e3, 'kJ/kg');
  sheet.output('s', state.s / 1e3, 'kJ/(kg.K)');
}

/** b.water-properties: properties of water and steam. */
export const WATER_PROPERTIES: Method = {
  id: 'b.water-properties',
  version: 1,
  topic: 'b.water-properties',
  title: 'Water and steam: properties',
  editions: ['IAPWS-IF97, release R7-97(2012)'],
  source:
    'IAPWS R7-97(2012), industrial formulation 1997 for water and steam; viscosity by IAPWS R12-08; both held against the check tables of the releases',
  validity: `${RANGE}; enthalpy and entropy are nought (to 1 J/kg) for the saturated liquid at the triple point; viscosity up to 1173.15 K, without the factor for the critical point.`,
  inputs: [
    optional('P', 'pressure', 'pressure-absolute'),
    optional('T', 'temperature', 'temperature'),
    optional('x', 'vapour mass fraction', 'dimensionless', { rangeKey: 'quality' }),
    optional('h', 'enthalpy above that of the liquid at the triple point', 'specific-energy'),
    optional('s', 'entropy above that of the liquid at the triple point', 'heat-capacity'),
    optional('atmospheric_pressure', 'barometric pressure', 'pressure-absolute', { rangeKey: 'barometer' }),
  ],
  outputs: [
    output('region', 'region of the formulation'),
    output('phase', 'what stands there'),
    output('P', 'pressure', 'pressure-absolute'),
    output('T', 'temperature', 'temperature'),
    output('saturation_temperature', 'saturation temperature at this pressure', 'temperature'),
    output('superheat', 'superheat', 'temperature-difference'),
    output('x', 'vapour mass fraction', 'dimensionless'),
    output('rho', 'density', 'density'),
    output('v', 'specific volume', 'specific-volume'),
    output('h', 'enthalpy', 'specific-energy'),
    output('s', 'entropy', 'heat-capacity'),
    output('cp', 'heat capacity at constant pressure', 'heat-capacity'),
    output('cv', 'heat capacity at constant volume', 'heat-capacity'),
    output('w', 'speed of sound', 'velocity'),
    output('mu', 'dynamic viscosity', 'viscosity'),
    output('Z', 'compressibility factor', 'dimensionless'),
    output('cp_over_cv', 'ratio of specific heats of the real fluid', 'dimensionless'),
    output('isentropic_exponent', 'isentropic exponent of the real fluid', 'dimensionless'),
    output('latent_heat', 'latent heat of vaporisation', 'specific-energy'),
    ...(['liquid', 'vapour'] as const).flatMap((phase) => [
      output(`rho_${phase}`, `density of the saturated ${phase}`, 'density'),
      output(`h_${phase}`, `enthalpy of the saturated ${phase}`, 'specific-energy'),
      output(`cp_${phase}`, `heat capacity of the saturated ${phase}`, 'heat-capacity'),
      output(`w_${phase}`, `speed of sound in the saturated ${phase}`, 'velocity'),
      output(`mu_${phase}`, `viscosity of the saturated ${phase}`, 'viscosity'),
    ]),
  ],
  work(inputs, edition) {
    return workSheet(this, inputs, edition, (sheet) => {
      const pair = pairOf(sheet);
      const state = readState(sheet, pair);
      const region = regionOf(state) ?? 4;
      missingSteps(sheet, pair, state);
      const phase = phaseOf(state);
      sheet.say({
        symbol: '\\text{region}',
        meaning: `region of IAPWS-IF97: ${phase}`,
        value: String(region),
        tex: `\\text{IAPWS-IF97, region ${region}}`,
        clause: 'IAPWS R7-97(2012), section 2 and Fig. 1',
      });
      if (state.x === undefined) onePhase(sheet, pair, state);
      else boiling(sheet, pair, state);
      outputs(sheet, state);
      sheet.output('region', String(region));
      sheet.output('phase', phase);
    });
  },
};
