/* Method f.inadvertent-opening: a valve to a higher-pressure system is opened by mistake, full bore. */
import { type Method } from '../../catalog/types';
import { type SheetBuilder, workSheet } from '../../sheet';
import { input, optional, output } from '../common/describe';
import { ductFlux } from './duct';
import { HIGH_SIDE_INPUTS, loadOutput } from './orifice';

/** Flow of a round pipe in kg/h: bore m, mass flux kg/(m²·s). */
export function boreFlow(bore: number, flux: number): number {
  return 3600 * (Math.PI / 4) * bore ** 2 * flux;
}

/** Velocity heads of valve, fittings and entrance with the friction of the pipe; without the exit. */
function resistance(sheet: SheetBuilder, bore: number): number {
  const K = sheet.number('sum_K', '-', { min: 0 }, '\\Sigma K');
  if (!sheet.has('length')) return sheet.keep('N', K, '\\Sigma K');
  const f = sheet.number('f_darcy', '-', { above: 0 }, 'f');
  const L = sheet.number('length', 'm', { min: 0 }, 'L');
  return sheet.step(
    { key: 'N', meaning: 'velocity heads of valve, fittings and pipe', value: K + (f * L) / bore, unit: '-' },
    (v) => `${v('sum_K')} + \\frac{${v('f_darcy')} \\cdot ${v('length')}}{${v('bore')}}`,
  );
}

/** f.inadvertent-opening: flow through a valve opened by mistake. */
export const INADVERTENT_OPENING: Method = {
  id: 'f.inadvertent-opening',
  version: 1,
  topic: 'f.inadvertent-opening',
  title: 'Valve opened by mistake to a higher pressure',
  editions: ['API 521, 5th to 7th edition (approach)'],
  source:
    'API Standard 521, inadvertent valve opening: full bore, greatest upstream pressure (from memory); liquid by velocity heads, gas by adiabatic flow with friction (Perry’s handbook, Lapple)',
  validity:
    'One bore; liquid that does not flash, or ideal gas with constant Z and k; K of the open valve and the entrance entered without the exit. Steam, purge and hose connections count alike.',
  inputs: [
    input('bore', 'inside diameter of the connection', 'length', { rangeKey: 'bore' }),
    input(
      'sum_K',
      'loss coefficients of entrance, open valve and fittings, without the exit',
      'dimensionless',
      { rangeKey: 'sumK' },
    ),
    ...HIGH_SIDE_INPUTS,
    optional('length', 'length of pipe', 'length'),
    optional('f_darcy', 'Darcy friction factor of the pipe', 'dimensionless', { rangeKey: 'frictionFactor' }),
  ],
  outputs: [
    output('velocity_heads', 'velocity heads without the exit', 'dimensionless'),
    output('choked', 'whether the gas is choked'),
    output('relief_load', 'relief load', 'mass-flow'),
  ],
  work(inputs, edition) {
    return workSheet(this, inputs, edition, (sheet) => {
      const bore = sheet.number('bore', 'm', { above: 0 }, 'D');
      const N = resistance(sheet, bore);
      const phase = sheet.word('phase', ['liquid', 'gas'] as const, 'liquid');
      const flux = ductFlux(sheet, phase, N);
      const W = sheet.step(
        { key: 'W', meaning: 'flow through the open connection', value: boreFlow(bore, flux), unit: 'kg/h' },
        (v) => `3600 \\cdot \\frac{\\pi}{4} ${v('bore')}^2 \\cdot ${v('Gd')}`,
      );
      sheet.output('velocity_heads', N);
      loadOutput(sheet, 'relief_load', W);
    });
  },
};
