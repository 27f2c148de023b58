/* Method g.outlet-isothermal: back pressure of a gas line at constant temperature, as to a header. */
import { type Method } from '../../catalog/types';
import { boreArea, isothermalLine, type IsothermalSegment } from '../../lines';
import { type SheetBuilder, workSheet } from '../../sheet';
import { GAS_CONSTANT } from '../a-gas/flow';
import { GAS_INPUTS, input, output } from '../common/describe';
import { backPressureSteps, OUTLET_INPUTS, OUTLET_OUTPUTS, segmentOutputs, segmentPressures } from './outlet';
import { endPressure } from './pressures';
import { fluxStep, readSegments } from './read';
import { nameAt, ofSegment, readEach, symbolAt } from './series';

const CLAUSE = 'API 521, isothermal flow in outlet lines';

/** A worked segment with what its sheet needs besides; `reduces` where the next bore is smaller. */
type Worked = { found: IsothermalSegment; k: number; reduces: boolean };

/** The steps of one segment: limit, end pressure, inlet pressure, Mach number. `beyond` is the symbol of what follows. */
function segmentSteps(sheet: SheetBuilder, i: number, count: number, { found, k, reduces }: Worked): void {
  const beyond = i === count - 1 ? 'P_exit_ambient' : `pin ${i + 1}`;
  const named = (key: string, tex: string, meaning: string) => ({
    key: `${key} ${i}`,
    tex: symbolAt(tex, i, count),
    meaning: `${meaning}${ofSegment(i, count)}`,
    clause: CLAUSE,
  });
  const limit = found.outlet * found.machOut * Math.sqrt(k);
  sheet.step(
    {
      ...named('plim', 'p_{lim}', 'lowest pressure at the end (isothermal Mach 1)'),
      value: limit / 1e3,
      unit: 'kPa_abs',
    },
    (v) =>
      `10^{-3} \\cdot ${v(`G ${i}`)} \\sqrt{\\frac{${v(nameAt('Z', i))} \\cdot ${v('R')} \\cdot ${v('T')}}{${v('M')}}}`,
  );
  sheet.step(
    { ...named('pout', 'p_{out}', 'static pressure at the end'), value: found.outlet / 1e3, unit: 'kPa_abs' },
    (v) =>
      reduces && !found.choked
        ? `${v(beyond)} \\cdot \\exp\\left(\\tfrac{1}{2}(Ma_{2}^2 - Ma_{1}^2)\\right)`
        : `\\max(${v(beyond)},\\ ${v(`plim ${i}`)})`,
  );
  sheet.keep(`pin ${i}`, found.inlet / 1e3, symbolAt('p_{in}', i, count));
  sheet.step(
    {
      ...named('pin', 'p_{in}', 'static pressure at the beginning'),
      value: found.inlet / 1e3,
      unit: 'kPa_abs',
    },
    (v) =>
      `\\sqrt{${v(`pout ${i}`)}^2 + 10^{-6} \\cdot ${v(`G ${i}`)}^2 \\, \\frac{${v(nameAt('Z', i))} \\cdot ${v('R')} \\cdot ${v('T')}}{${v('M')}} \\left(${v(`N ${i}`)} + 2 \\ln\\frac{${v(`pin ${i}`)}}{${v(`pout ${i}`)}}\\right)}`,
  );
  sheet.step(
    {
      ...named('Ma', 'Ma', 'Mach number at the end, by the adiabatic speed of sound'),
      value: found.machOut,
      unit: '-',
    },
    (v) => `\\frac{${v(`plim ${i}`)}}{${v(`pout ${i}`)} \\sqrt{${v('k')}}}`,
  );
  segmentPressures(sheet, i, { inlet: found.inlet / 1e3, outlet: found.outlet / 1e3, choked: found.choked });
  sheet.output(`segment${i + 1}_outlet_Mach_adiabatic`, found.machOut);
}

/** g.outlet-isothermal: back pressure by isothermal compressible flow, marched from the end of the line. */
export const OUTLET_ISOTHERMAL: Method = {
  id: 'g.outlet-isothermal',
  version: 1,
  topic: 'g.outlet-isothermal',
  title: 'Outlet line of a gas: back pressure, isothermal',
  editions: ['API 521, 6th and 7th edition'],
  source: 'API Standard 521, isothermal flow equation (from memory); textbook gas dynamics',
  validity:
    'Ideal gas at constant temperature, Z constant in each segment; Darcy friction factor; static pressure continuous at enlargements; no phase change in the line.',
  inputs: [
    ...OUTLET_INPUTS,
    ...GAS_INPUTS.filter((one) => one.name !== 'Z'),
    input('Z', 'compressibility factor, given once or for each segment', 'dimensionless', {
      rangeKey: 'z',
      each: 'segment',
    }),
  ],
  outputs: [
    ...segmentOutputs((s) => [
      output(
        `${s}_outlet_Mach_adiabatic`,
        'Mach number there by the adiabatic speed of sound',
        'dimensionless',
      ),
    ]),
    ...OUTLET_OUTPUTS,
  ],
  work(inputs, edition) {
    return workSheet(this, inputs, edition, (sheet) => {
      const T = sheet.number('T', 'K', { above: 0 });
      const M = sheet.number('M', 'kg/kmol', { above: 0 });
      const k = sheet.number('k', '-', { min: 1 });
      sheet.keep('R', GAS_CONSTANT, 'R');
      const end = endPressure(sheet);
      const { count, D, W, N } = readSegments(sheet);
      const Z = readEach(sheet, 'Z', count, { unit: '-', bounds: { above: 0 }, tex: 'Z' });
      const segments = D.map((bore, i) => ({ D: bore, W: W[i] ?? 0, N: N[i] ?? 0, Z: Z[i] ?? 1 }));
      const worked = isothermalLine(segments, { T, Z: Z[0] ?? 1, M, k }, end * 1e3);
      for (let i = count - 1; i >= 0; i -= 1) {
        const found = worked[i];
        if (!found) continue;
        fluxStep(sheet, i, count, (W[i] ?? 0) / boreArea(D[i] ?? 1));
        const reduces = (D[i + 1] ?? Infinity) < (D[i] ?? 0) * (1 - 1e-9);
        segmentSteps(sheet, i, count, { found, k, reduces });
      }
      backPressureSteps(sheet, {
        inlet: (worked[0]?.inlet ?? Number.NaN) / 1e3,
        end,
        mach: Math.max(...worked.map((one) => one.machOut)),
        chokes: worked.some((one) => one.choked),
      });
    });
  },
};
