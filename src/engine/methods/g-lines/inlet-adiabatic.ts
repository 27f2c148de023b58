/* The adiabatic form of an inlet line: isentropic entrance from the vessel, then friction, segment after segment to the device. */
import { boreArea, inletLine, type FedLine, type LineGas } from '../../lines';
import { type SheetBuilder } from '../../sheet';
import { GAS_CONSTANT } from '../a-gas/flow';
import { absoluteIn } from '../common/pressures';
import { pressureOutput } from './pressures';
import { fluxStep, readSegments } from './read';
import { ofSegment, readEach, segmentCount, symbolAt } from './series';

const CLAUSE = 'isentropic entrance and Fanno flow, textbook of gas dynamics';

function readGas(sheet: SheetBuilder): LineGas & { P0: number } {
  const P0 = absoluteIn(sheet, 'P0', 'P_0', 'kPa_abs');
  const T = sheet.number('T0', 'K', { above: 0 }, 'T_0');
  const Z = sheet.number('Z', '-', { above: 0 });
  const M = sheet.number('M', 'kg/kmol', { above: 0 });
  const k = sheet.number('k', '-', { min: 1 });
  sheet.keep('R', GAS_CONSTANT, 'R');
  return { P0, T, Z, M, k };
}

/** Segments with their heads, given directly or by lengths and fittings. */
function readLine(sheet: SheetBuilder): { D: number[]; W: number[]; N: number[] } {
  if (!sheet.has('N')) return readSegments(sheet);
  const count = segmentCount(sheet);
  const D = readEach(sheet, 'D', count, { unit: 'm', bounds: { above: 0 }, tex: 'D' });
  const W = readEach(sheet, 'W', count, { unit: 'kg/s', bounds: { above: 0 }, tex: 'W' });
  const N = readEach(sheet, 'N', count, { unit: '-', bounds: { min: 0 }, tex: 'N' });
  N.forEach((heads, i) => sheet.keep(`N ${i}`, heads, symbolAt('N', i, count)));
  return { D, W, N };
}

function segmentSteps(sheet: SheetBuilder, i: number, count: number, found: FedLine): void {
  const before = i === 0 ? 'P0' : `p0 ${i - 1}`;
  const named = (key: string, tex: string, meaning: string) => ({
    key: `${key} ${i}`,
    tex: symbolAt(tex, i, count),
    meaning: `${meaning}${ofSegment(i, count)}`,
    clause: CLAUSE,
  });
  sheet.step(
    { ...named('Main', 'Ma_{in}', 'Mach number at the beginning'), value: found.machIn, unit: '-' },
    (v) => `Ma\\left(${v(`G ${i}`)} = \\text{flux from } ${v(before)}\\right)`,
  );
  sheet.step(
    { ...named('Maout', 'Ma_{out}', 'Mach number at the end'), value: found.machOut, unit: '-' },
    (v) => `\\varphi^{-1}\\left(\\varphi(${v(`Main ${i}`)}) - ${v(`N ${i}`)}\\right)`,
  );
  sheet.step(
    { ...named('pout', 'p_{out}', 'static pressure at the end'), value: found.exit / 1e3, unit: 'kPa_abs' },
    (v) =>
      `10^{-3} \\, \\frac{${v(`G ${i}`)}}{${v(`Maout ${i}`)}} \\sqrt{\\frac{${v('Z')} \\cdot ${v('R')} \\cdot ${v('T0')}}{${v('M')} \\cdot ${v('k')} \\left(1 + \\frac{${v('k')}-1}{2} ${v(`Maout ${i}`)}^2\\right)}}`,
  );
  sheet.step(
    {
      ...named('p0', 'p_{0}', 'stagnation pressure at the end'),
      value: found.exitStagnation / 1e3,
      unit: 'kPa_abs',
    },
    (v) =>
      `${v(`pout ${i}`)} \\left(1 + \\frac{${v('k')}-1}{2} ${v(`Maout ${i}`)}^2\\right)^{${v('k')}/(${v('k')}-1)}`,
  );
}

/** Works the line and its steps; the loss of stagnation pressure, kPa, kept as the symbol `stagnation loss`. */
export function adiabaticInlet(sheet: SheetBuilder): number {
  const { P0, ...gas } = readGas(sheet);
  const { D, W, N } = readLine(sheet);
  const rho0 = (P0 * 1e3 * gas.M) / (gas.Z * GAS_CONSTANT * gas.T);
  let stagnation = P0 * 1e3;
  let estimate = 0;
  const worked = D.map((bore, i) => {
    const G = (W[i] ?? 0) / boreArea(bore);
    fluxStep(sheet, i, D.length, G);
    const found = inletLine(stagnation, gas, G, N[i] ?? 0);
    if (!found)
      return sheet.refuse(
        'CHOKES',
        'W',
        `The inlet line cannot pass this flow: it chokes${ofSegment(i, D.length)}. Take a wider line, or check the flow.`,
      );
    segmentSteps(sheet, i, D.length, found);
    stagnation = found.exitStagnation;
    estimate += ((N[i] ?? 0) * G * G) / (2e3 * rho0);
    return found;
  });
  const last = worked.at(-1);
  const loss = P0 - stagnation / 1e3;
  sheet.step(
    {
      key: 'stagnation loss',
      tex: '\\Delta p_0',
      meaning: 'loss of stagnation pressure',
      value: loss,
      unit: 'kPa',
      clause: CLAUSE,
    },
    (v) => `${v('P0')} - ${v(`p0 ${D.length - 1}`)}`,
  );
  sheet.output('Mach_in', worked[0]?.machIn ?? Number.NaN);
  sheet.output('Mach_out', last?.machOut ?? Number.NaN);
  pressureOutput(sheet, 'static_pressure_at_valve', (last?.exit ?? Number.NaN) / 1e3, 'absolute');
  pressureOutput(sheet, 'stagnation_pressure_at_valve', stagnation / 1e3, 'absolute');
  pressureOutput(sheet, 'stagnation_loss', loss, 'difference');
  pressureOutput(sheet, 'loss', loss, 'difference');
  pressureOutput(sheet, 'incompressible_estimate', estimate, 'difference');
  return loss;
}
