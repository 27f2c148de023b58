/* The steps of a sheet of boiling water: both saturated phases and their mixture. */
import { type PhaseState } from '../../properties/types';
import { type SheetBuilder } from '../../sheet';
import { LIMITS_T } from '../../water/constants';

/** The property of one phase that a sheet shows: symbol, meaning, unit and factor from SI. */
const SHOWN = [
  ['v', 'v', 'specific volume', 'm3/kg', 1],
  ['h', 'h', 'enthalpy', 'kJ/kg', 1e-3],
  ['s', 's', 'entropy', 'kJ/(kg.K)', 1e-3],
  ['cp', 'c_p', 'heat capacity at constant pressure', 'kJ/(kg.K)', 1e-3],
] as const;

const valueOf = (state: PhaseState, key: (typeof SHOWN)[number][0]) =>
  key === 'v' ? 1 / state.rho : state[key];

/** The saturated phases, each figure a step named with ′ for the liquid and ″ for the vapour. */
export function saturatedSteps(sheet: SheetBuilder, liquid: PhaseState, vapour: PhaseState): void {
  const near = liquid.T > LIMITS_T.one;
  for (const [state, mark, name, region] of [
    [liquid, "'", 'saturated liquid', near ? 3 : 1],
    [vapour, "''", 'saturated steam', near ? 3 : 2],
  ] as const)
    for (const [key, tex, meaning, unit, factor] of SHOWN)
      sheet.step(
        {
          key: `${key}${mark}`,
          tex: `${tex}${mark}`,
          meaning: `${meaning} of the ${name}`,
          value: valueOf(state, key) * factor,
          unit,
          clause: `IAPWS R7-97(2012), basic equation of region ${region}`,
        },
        (v) => `{${tex}}_{\\text{region ${region}}}(${v('P')},\\ ${v('T')})`,
      );
  sheet.step(
    {
      key: 'latent',
      tex: '\\lambda',
      meaning: 'latent heat of vaporisation',
      value: (vapour.h - liquid.h) / 1e3,
      unit: 'kJ/kg',
    },
    (v) => `${v("h''")} - ${v("h'")}`,
  );
}

/** The vapour fraction from the enthalpy or the entropy of the mixture, when it was not given. */
export function fractionStep(sheet: SheetBuilder, given: 'h' | 's', x: number): void {
  sheet.step(
    { key: 'x', meaning: 'vapour mass fraction', value: x, unit: '-' },
    (v) => `\\frac{${v(given)} - ${v(`${given}'`)}}{${v(`${given}''`)} - ${v(`${given}'`)}}`,
  );
}

/** Volume, density, enthalpy and entropy of the mixture by its vapour fraction. */
export function mixtureSteps(sheet: SheetBuilder, state: { rho: number; h: number; s: number }): void {
  const mix = (key: 'v' | 'h' | 's', meaning: string, value: number, unit: string) =>
    sheet.step(
      { key, meaning: `${meaning} of the mixture`, value, unit },
      (v) => `${v(`${key}'`)} + ${v('x')} \\cdot (${v(`${key}''`)} - ${v(`${key}'`)})`,
    );
  mix('v', 'specific volume', 1 / state.rho, 'm3/kg');
  sheet.step(
    { key: 'rho', tex: '\\rho', meaning: 'density of the mixture', value: state.rho, unit: 'kg/m3' },
    (v) => `\\frac{1}{${v('v')}}`,
  );
  mix('h', 'enthalpy', state.h / 1e3, 'kJ/kg');
  mix('s', 'entropy', state.s / 1e3, 'kJ/(kg.K)');
}
