/* Method f.tube-rupture: flow through a broken exchanger tube, as two open ends or as a short and a long side. */
import { type Method } from '../../catalog/types';
import { type SheetBuilder, workSheet } from '../../sheet';
import { input, optional, output } from '../common/describe';
import { ductFlux, ductLiquid } from './duct';
import { FLASHING_INPUTS, flashingFlux } from './flashing-flux';
import { BREAK_PHASES, fluxSteps, HIGH_SIDE_INPUTS, loadOutput, readSides } from './orifice';

const CLAUSE = 'API 521, heat-transfer equipment failure';

/** Flow of a full-bore opening in kg/h. */
export function openEnd(Cd: number, diameter: number, flux: number): number {
  return 3600 * Cd * (Math.PI / 4) * diameter ** 2 * flux;
}

/** Flow of the long side of a tube in kg/h from the mass flux in its leg. */
export function longSide(diameter: number, legFlux: number): number {
  return 3600 * (Math.PI / 4) * diameter ** 2 * legFlux;
}

function bothEnds(sheet: SheetBuilder, d: number, Cd: number, flux: number): void {
  const n = sheet.number('n_ends', '-', { above: 0, fallback: 2 }, 'n');
  const W = sheet.step(
    {
      key: 'W',
      meaning: 'flow through the open ends',
      value: n * openEnd(Cd, d, flux),
      unit: 'kg/h',
      clause: CLAUSE,
      memory: true,
    },
    (v) =>
      `3600 \\cdot ${v('n_ends')} \\cdot ${v('Cd')} \\cdot \\frac{\\pi}{4} ${v('tube_id')}^2 \\cdot ${v('G')}`,
  );
  loadOutput(sheet, 'relief_load', W);
}

/** Velocity heads of the leg of tube without its exit, which the liquid loses besides. */
function legHeads(sheet: SheetBuilder, d: number): number {
  const f = sheet.number('f_darcy', '-', { above: 0 }, 'f');
  const L = sheet.number('tube_length', 'm', { above: 0 }, 'L');
  const Kin = sheet.number('K_entrance', '-', { min: 0, fallback: 0.5 }, 'K_{in}');
  return sheet.step(
    {
      key: 'N',
      meaning: 'velocity heads of the leg without its exit',
      value: Kin + (f * L) / d,
      unit: '-',
      clause: CLAUSE,
    },
    (v) => `${v('K_entrance')} + \\frac{${v('f_darcy')} \\cdot ${v('tube_length')}}{${v('tube_id')}}`,
  );
}

/** Mass flux in the leg: a liquid by its velocity heads with the exit, a gas by adiabatic flow with friction. */
function legFlux(sheet: SheetBuilder, d: number, phase: 'liquid' | 'gas'): number {
  const N = legHeads(sheet, d);
  if (phase === 'gas') return ductFlux(sheet, phase, N);
  const { high, low } = readSides(sheet);
  const rho = sheet.number('rho', 'kg/m3', { above: 0 }, '\\rho');
  const Kout = sheet.number('K_exit', '-', { min: 0, fallback: 1 }, 'K_{out}');
  if (N + Kout <= 0)
    sheet.refuse(
      'VALUE_IMPOSSIBLE',
      'K_exit',
      'The leg of tube has no resistance at all: give its friction.',
    );
  return sheet.step(
    {
      key: 'Gd',
      tex: 'G_d',
      meaning: 'mass flux in the leg, liquid',
      value: ductLiquid(rho, (high - low) * 1000, N + Kout),
      unit: 'kg/(m2.s)',
      clause: CLAUSE,
    },
    (v) => `\\frac{${v('G')}}{\\sqrt{${v('N')} + ${v('K_exit')}}}`,
  );
}

function shortAndLong(sheet: SheetBuilder, d: number, Cd: number, flux: number, leg: number): void {
  const short = sheet.step(
    {
      key: 'Ws',
      tex: 'W_{short}',
      meaning: 'flow through the end at the tube sheet',
      value: openEnd(Cd, d, flux),
      unit: 'kg/h',
      clause: CLAUSE,
    },
    (v) => `3600 \\cdot ${v('Cd')} \\cdot \\frac{\\pi}{4} ${v('tube_id')}^2 \\cdot ${v('G')}`,
  );
  const long = sheet.step(
    {
      key: 'Wl',
      tex: 'W_{long}',
      meaning: 'flow through the long tube',
      value: longSide(d, leg),
      unit: 'kg/h',
      clause: CLAUSE,
    },
    (v) => `3600 \\cdot \\frac{\\pi}{4} ${v('tube_id')}^2 \\cdot ${v('Gd')}`,
  );
  const W = sheet.step(
    { key: 'W', meaning: 'flow of both sides', value: short + long, unit: 'kg/h' },
    (v) => `${v('Ws')} + ${v('Wl')}`,
  );
  loadOutput(sheet, 'flow_short_side', short);
  loadOutput(sheet, 'flow_long_side', long);
  loadOutput(sheet, 'relief_load', W);
}

/** The flux at a full-bore end by phase, kept under `G`. */
function endFlux(sheet: SheetBuilder, phase: (typeof BREAK_PHASES)[number]): number {
  return phase === 'flashing' ? flashingFlux(sheet) : fluxSteps(sheet, phase);
}

/** f.tube-rupture: relief load of a broken tube. */
export const TUBE_RUPTURE: Method = {
  id: 'f.tube-rupture',
  version: 1,
  topic: 'f.tube-rupture',
  title: 'Rupture of an exchanger tube',
  editions: ['API 521, 5th to 7th edition'],
  source:
    'Orifice flow through full-bore open ends, API Standard 521 assumption of a double-ended break (from memory)',
  validity:
    'Liquid that does not flash, ideal gas, or a flashing fluid by the omega method or a given flux; Cd is an input because practice differs; with a long side the gas leg is adiabatic with friction; of a flashing fluid both ends count as open.',
  inputs: [
    input('tube_id', 'inside diameter of the tube', 'length', { rangeKey: 'tubeBore' }),
    input('Cd', 'coefficient of the break', 'dimensionless', { rangeKey: 'orificeCd' }),
    optional('n_ends', 'number of open ends (2 when not given)', 'dimensionless'),
    ...HIGH_SIDE_INPUTS.map((one) => (one.name === 'phase' ? { ...one, words: [...BREAK_PHASES] } : one)),
    ...FLASHING_INPUTS,
    optional('f_darcy', 'Darcy friction factor of the long side', 'dimensionless', {
      rangeKey: 'frictionFactor',
    }),
    optional('tube_length', 'length of the long side', 'length'),
    optional('K_entrance', 'entrance loss coefficient (0.5 when not given)', 'dimensionless', {
      rangeKey: 'sumK',
    }),
    optional('K_exit', 'exit loss coefficient (1 when not given)', 'dimensionless', { rangeKey: 'sumK' }),
  ],
  outputs: [
    output('choked', 'whether the gas is choked'),
    output('flow_short_side', 'flow at the tube sheet', 'mass-flow'),
    output('flow_long_side', 'flow through the long tube', 'mass-flow'),
    output('relief_load', 'relief load', 'mass-flow'),
  ],
  work(inputs, edition) {
    return workSheet(this, inputs, edition, (sheet) => {
      const d = sheet.number('tube_id', 'm', { above: 0 }, 'd');
      const Cd = sheet.number('Cd', '-', { above: 0, max: 1 }, 'C_d');
      const phase = sheet.word('phase', BREAK_PHASES, 'liquid');
      const long = sheet.has('tube_length');
      if (long && phase === 'flashing')
        return sheet.refuse(
          'NOT_WORKED',
          'tube_length',
          'The long side is not worked for a flashing fluid; take both ends as open, which is on the safe side.',
        );
      const flux = endFlux(sheet, phase);
      if (long && phase !== 'flashing') shortAndLong(sheet, d, Cd, flux, legFlux(sheet, d, phase));
      else bothEnds(sheet, d, Cd, flux);
    });
  },
};
