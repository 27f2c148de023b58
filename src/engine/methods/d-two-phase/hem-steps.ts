/* The steps of a nozzle integrated along the isentrope, shared by flux, sizing and comparison. */
import { hemThroat, type PathState, pathState, type Throat } from '../../nozzle/hem';
import { type Inlet } from '../../nozzle/inlet';
import { type PropertySource } from '../../properties/types';
import { type SheetBuilder, texNumber } from '../../sheet';

/** The clause that the sheets of direct integration name. */
export const HEM_CLAUSE = 'API 520-1 Annex B and C, numerical integration of an isentropic nozzle';

/** Names the fluid and its formulation, and gives the state at rest. */
export function inletSteps(sheet: SheetBuilder, source: PropertySource, inlet: Inlet): void {
  const { state, phase } = inlet;
  sheet.say({
    symbol: '\\text{fluid}',
    meaning: source.source,
    value: source.name,
    tex: `M = ${texNumber(source.M)}\\,\\text{kg/kmol}`,
  });
  const given = sheet.has('x0') ? '(P_0, x_0)' : '(P_0, T_0)';
  const property = (key: string, tex: string, meaning: string, value: number, unit: string) =>
    sheet.step(
      { key, tex, meaning, value, unit, clause: source.source },
      () => `${tex.replace(/_0$/, '')}${given}`,
    );
  property('rho0', '\\rho_0', `density at the inlet (${phase})`, state.rho, 'kg/m3');
  if (sheet.has('x0')) property('T0', 'T_0', 'temperature at the inlet', state.T, 'K');
  property('h0', 'h_0', 'enthalpy at the inlet', state.h / 1000, 'kJ/kg');
  property('s0', 's_0', 'entropy at the inlet', state.s / 1000, 'kJ/(kg.K)');
  sheet.output('inlet_density', state.rho, 'kg/m3');
  sheet.output('inlet_temperature', state.T, 'K');
}

const mark = (n: number): string => `_{${n === 0 ? 't' : n === 1 ? 'a' : 'b'}}`;

/** Enthalpy, density and mass flux at one pressure of the isentrope: a line that can be worked again by hand. */
function fluxLine(sheet: SheetBuilder, state: PathState, place: number, meaning: string): number {
  const i = mark(place);
  sheet.keep(`P${i}`, state.P / 1000, `P${i}`);
  sheet.keep(`dh${i}`, state.velocity ** 2 / 2, `\\Delta h${i}`);
  sheet.keep(`rho${i}`, state.rho, `\\rho${i}`);
  return sheet.step(
    {
      key: place === 0 ? 'G' : `G${i}`,
      tex: place === 0 ? 'G' : `G${i}`,
      meaning,
      value: state.flux,
      unit: 'kg/(m2.s)',
      clause: HEM_CLAUSE,
    },
    (v) => `${v(`rho${i}`)} \\sqrt{2 \\cdot ${v(`dh${i}`)}}`,
  );
}

function throatState(sheet: SheetBuilder, throat: Throat): void {
  const info = (key: string, tex: string, meaning: string, value: number, unit: string) =>
    sheet.step(
      { key, tex, meaning, value, unit, clause: HEM_CLAUSE },
      () => `${tex.replace('_t', '')}(P_t, s_0)`,
    );
  const why = throat.choked
    ? throat.atOnset
      ? 'throat pressure: where flashing or condensing begins, the flux has its greatest value'
      : 'throat pressure: where the mass flux along the isentrope has its greatest value'
    : 'throat pressure: the back pressure, reached before the flux has its greatest value';
  sheet.step(
    {
      key: 'P_t',
      tex: 'P_t',
      meaning: why,
      value: throat.P / 1000,
      unit: 'kPa_abs',
      clause: HEM_CLAUSE,
      memory: true,
    },
    (v) => (throat.choked ? '\\arg\\max_P\\ \\rho(P, s_0) \\sqrt{2(h_0 - h(P, s_0))}' : v('back')),
  );
  info('h_t', 'h_t', 'enthalpy at the throat', throat.h / 1000, 'kJ/kg');
  // The difference stands as a line of its own: two printed enthalpies do not carry the figures that a hand check needs.
  sheet.step(
    {
      key: 'dh_t',
      tex: '\\Delta h_t',
      meaning: 'drop of enthalpy from the inlet to the throat',
      value: throat.velocity ** 2 / 2,
      unit: 'J/kg',
      clause: HEM_CLAUSE,
    },
    () => '1000\\,(h_0 - h_t)',
  );
  info('rho_t', '\\rho_t', 'density at the throat', throat.rho, 'kg/m3');
  if (throat.x !== undefined) info('x_t', 'x_t', 'vapour mass fraction at the throat', throat.x, '-');
}

/** The throat's outputs under the names of the reference. */
function throatOutputs(sheet: SheetBuilder, throat: Throat): void {
  sheet.output('mass_flux', throat.flux, 'kg/(m2.s)');
  sheet.output('throat_pressure', throat.P / 1000, 'kPa_abs');
  sheet.output('throat_density', throat.rho, 'kg/m3');
  sheet.output('choked', throat.choked);
  if (throat.x !== undefined) sheet.output('throat_quality', throat.x);
}

/**
 * Integrates from the inlet against Pb (Pa), shows throat and flux, and the flux a little above and below it, so that a
 * reader sees the maximum; refuses where the properties end before the throat is found.
 */
export function nozzleSteps(sheet: SheetBuilder, source: PropertySource, inlet: Inlet, Pb: number): Throat {
  inletSteps(sheet, source, inlet);
  sheet.keep('back', Pb / 1000, 'P_b');
  const throat = hemThroat(source, inlet.state, Pb);
  if (!throat)
    return sheet.refuse(
      'OUTSIDE_FORMULATION',
      'fluid',
      `The isentrope of ${source.name} leaves the range of its properties before a throat is found (${source.source}). Paste a table of the isentrope instead (d.isentrope-table-integration).`,
    );
  throatState(sheet, throat);
  fluxLine(sheet, throat, 0, 'mass flux at the throat');
  const beside = [
    {
      state: pathState(source, inlet.state, Math.min(throat.P * 1.02, inlet.state.P)),
      place: 1,
      side: 'above',
    },
    { state: pathState(source, inlet.state, throat.P * 0.98), place: 2, side: 'below' },
  ];
  for (const { state, place, side } of beside)
    if (state && throat.choked)
      fluxLine(
        sheet,
        state,
        place,
        `check: mass flux 2 % ${side} the throat pressure, ${texNumber(state.P / 1000).replace(/\\,/g, '\u2009')} kPa`,
      );
  throatOutputs(sheet, throat);
  return throat;
}
