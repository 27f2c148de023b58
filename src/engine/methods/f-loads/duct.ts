/* Flow of a reservoir through a length of pipe (tube leg, connection): liquid, or gas with adiabatic friction. */
import { pipeDischarge } from '../../lines/entrance';
import { type SheetBuilder } from '../../sheet';
import { GAS_CONSTANT } from '../a-gas/flow';
import { readSides } from './orifice';

const CLAUSE = 'adiabatic flow with friction (Fanno) behind an isentropic entrance';

/** Mass flux of a liquid through N velocity heads, kg/(m²·s); `drop` in Pa. */
export function ductLiquid(rho: number, drop: number, N: number): number {
  return Math.sqrt((2 * rho * Math.max(0, drop)) / N);
}

function liquidStep(sheet: SheetBuilder, high: number, low: number, N: number): number {
  const rho = sheet.number('rho', 'kg/m3', { above: 0 }, '\\rho');
  const heads = sheet.step(
    { key: 'Nl', tex: 'N_l', meaning: 'velocity heads with the exit', value: N + 1, unit: '-' },
    (v) => `${v('N')} + 1`,
  );
  return sheet.step(
    {
      key: 'Gd',
      tex: 'G_d',
      meaning: 'mass flux in the pipe, liquid',
      value: ductLiquid(rho, (high - low) * 1000, heads),
      unit: 'kg/(m2.s)',
    },
    (v) => `\\sqrt{\\frac{2 \\cdot ${v('rho')} \\cdot 1000 (${v('P_high')} - ${v('P_low')})}{${v('Nl')}}}`,
  );
}

function gasStep(sheet: SheetBuilder, high: number, low: number, N: number): number {
  const T = sheet.number('T', 'K', { above: 0 });
  const Z = sheet.number('Z', '-', { above: 0 });
  const M = sheet.number('M', 'kg/kmol', { above: 0 });
  const k = sheet.number('k', '-', { min: 1 });
  const flow = pipeDischarge(high * 1000, { T, Z, M, k }, N, low * 1000);
  if (!flow || !Number.isFinite(flow.flux))
    return sheet.refuse(
      'NO_RESULT',
      'P_high',
      'No flow of gas through this pipe was found with these inputs.',
    );
  sheet.keep('R', GAS_CONSTANT);
  sheet.step(
    {
      key: 'Ma',
      tex: 'Ma_1',
      meaning: 'Mach number at the entrance, root of the Fanno relation',
      value: flow.machIn,
      unit: '-',
      clause: CLAUSE,
    },
    (v) =>
      `\\text{root of } F(Ma_1) - F(Ma_2) = ${v('N')},\\ F(Ma) = \\tfrac{1 - Ma^2}{k\\,Ma^2} + \\tfrac{k+1}{2k} \\ln \\tfrac{(k+1)\\,Ma^2}{2 + (k-1)\\,Ma^2},\\ k = ${v('k')}`,
  );
  sheet.output('choked', flow.choked);
  return sheet.step(
    {
      key: 'Gd',
      tex: 'G_d',
      meaning: `mass flux in the pipe, gas, ${flow.choked ? 'choked at its end' : 'not choked'}`,
      value: flow.flux,
      unit: 'kg/(m2.s)',
      clause: CLAUSE,
    },
    (v) =>
      `1000 \\cdot ${v('P_high')} \\cdot ${v('Ma')} \\sqrt{\\frac{${v('k')} \\cdot ${v('M')}}{${v('Z')} \\cdot ${v('R')} \\cdot ${v('T')}}} \\left(1 + \\tfrac{${v('k')}-1}{2} ${v('Ma')}^2\\right)^{-\\frac{${v('k')}+1}{2(${v('k')}-1)}}`,
  );
}

/**
 * Mass flux through a pipe of N velocity heads without its exit (kept under the key `N`), kg/(m²·s): a liquid also loses its
 * exit velocity head; a gas leaves at the lower pressure, or choked.
 */
export function ductFlux(sheet: SheetBuilder, phase: 'liquid' | 'gas', N: number): number {
  const { high, low } = readSides(sheet);
  return phase === 'liquid' ? liquidStep(sheet, high, low, N) : gasStep(sheet, high, low, N);
}
