/* Method g.outlet-liquid: back pressure of a line full of liquid that does not flash. */
import { type Method } from '../../catalog/types';
import { boreArea, liquidDrop } from '../../lines';
import { type SheetBuilder, workSheet } from '../../sheet';
import { input, optional, output } from '../common/describe';
import { backPressureSteps, OUTLET_INPUTS, OUTLET_OUTPUTS, segmentOutputs, segmentPressures } from './outlet';
import { endPressure } from './pressures';
import { readSegments } from './read';
import { nameAt, ofSegment, readEach, symbolAt } from './series';

const CLAUSE = 'Darcy–Weisbach with static head';
type Segment = { D: number; W: number; N: number; rise: number };

/** Velocity and inlet pressure of one segment, kPa: what lies beyond, friction, and the weight of the rise. */
function segmentSteps(
  sheet: SheetBuilder,
  i: number,
  count: number,
  segment: Segment,
  { rho, beyond }: { rho: number; beyond: number },
): number {
  sheet.step(
    {
      key: `v ${i}`,
      tex: symbolAt('v', i, count),
      meaning: `velocity${ofSegment(i, count)}`,
      value: segment.W / rho / boreArea(segment.D),
      unit: 'm/s',
    },
    (v) => `\\frac{4 \\, ${v(nameAt('W', i))}}{\\pi \\, ${v(nameAt('D', i))}^2 \\cdot ${v('rho')}}`,
  );
  const after = i === count - 1 ? 'P_exit_ambient' : `pin ${i + 1}`;
  return sheet.step(
    {
      key: `pin ${i}`,
      tex: symbolAt('p_{in}', i, count),
      meaning: `static pressure at the beginning${ofSegment(i, count)}`,
      value: beyond + liquidDrop(segment, rho) / 1e3,
      unit: 'kPa_abs',
      clause: CLAUSE,
    },
    (v) =>
      `${v(after)} + 10^{-3} \\left(${v(`N ${i}`)} \\, \\frac{${v('rho')} \\cdot ${v(`v ${i}`)}^2}{2}${segment.rise === 0 ? '' : ` + ${v('rho')} \\cdot 9.80665 \\cdot ${v(nameAt('rise', i))}`}\\right)`,
  );
}

/** g.outlet-liquid: back pressure by incompressible flow, marched from the end of the line. */
export const OUTLET_LIQUID: Method = {
  id: 'g.outlet-liquid',
  version: 1,
  topic: 'g.outlet-liquid',
  title: 'Outlet line of a liquid: back pressure',
  editions: ['textbook'],
  source: 'Darcy–Weisbach with Colebrook–White, textbook of fluid mechanics',
  validity:
    'Liquid of constant density that stays liquid to the end: the pressure nowhere falls below the vapour pressure. The pressure regained at an enlargement is left out.',
  inputs: [
    ...OUTLET_INPUTS,
    input('rho', 'density', 'density'),
    optional('rise', 'height of the end of a segment above its beginning', 'length', {
      rangeKey: 'rise',
      each: 'segment',
    }),
    optional('vapour_pressure', 'vapour pressure at the temperature in the line', 'pressure-absolute'),
  ],
  outputs: [
    ...segmentOutputs(() => []),
    output('velocity', 'highest velocity in the line', 'velocity'),
    ...OUTLET_OUTPUTS,
  ],
  work(inputs, edition) {
    return workSheet(this, inputs, edition, (sheet) => {
      const rho = sheet.number('rho', 'kg/m3', { above: 0 }, '\\rho');
      const end = endPressure(sheet);
      const { count, D, W, N } = readSegments(sheet);
      const rise = readEach(sheet, 'rise', count, { unit: 'm', bounds: { fallback: 0 }, tex: 'h' });
      let beyond = end;
      for (let i = count - 1; i >= 0; i -= 1) {
        const segment = { D: D[i] ?? 1, W: W[i] ?? 0, N: N[i] ?? 0, rise: rise[i] ?? 0 };
        const inlet = segmentSteps(sheet, i, count, segment, { rho, beyond });
        if (inlet <= 0)
          sheet.refuse(
            'NO_RESULT',
            nameAt('rise', i),
            `The liquid would pull a vacuum${ofSegment(i, count)}: the line does not run full. Check the fall.`,
          );
        segmentPressures(sheet, i, { inlet, outlet: beyond, choked: false });
        beyond = inlet;
      }
      sheet.output('velocity', Math.max(...D.map((bore, i) => (W[i] ?? 0) / rho / boreArea(bore))), 'm/s');
      if (sheet.has('vapour_pressure') && end < sheet.number('vapour_pressure', 'kPa_abs', { min: 0 }, 'p_v'))
        sheet.warn(
          'FLASHES',
          'The pressure at the end is below the vapour pressure: the liquid flashes in the line and this method does not hold.',
          'above the vapour pressure',
        );
      backPressureSteps(sheet, { inlet: beyond, end, mach: 0, chokes: false });
    });
  },
};
