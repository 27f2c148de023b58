/* The steps of one segment of adiabatic flow, from its end upstream, as a hand calculation would go. */
import { type AdiabaticSegment } from '../../lines';
import { type SheetBuilder, type Show } from '../../sheet';
import { segmentPressures } from './outlet';
import { nameAt, ofSegment, symbolAt } from './series';

/** How the pressure at a segment's end follows from what lies beyond it. */
export type Joint = 'end' | 'static' | 'momentum' | 'reduction';

const CLAUSE = 'Fanno flow, textbook of gas dynamics';
const JOINTS: Record<Joint, string> = {
  end: 'pressure beyond the line',
  static: 'static pressure continuous',
  momentum: 'momentum balance of the sudden enlargement',
  reduction: 'stagnation pressure continuous into the reduction',
};

type Segment = { sheet: SheetBuilder; i: number; count: number; found: AdiabaticSegment; joint: Joint };

function named({ i, count }: Segment, key: string, tex: string, meaning: string) {
  return {
    key: `${key} ${i}`,
    tex: symbolAt(tex, i, count),
    meaning: `${meaning}${ofSegment(i, count)}`,
    clause: CLAUSE,
  };
}

/** 10⁻³ G/Ma √(Z R T0/(M k (1 + (k−1)/2 Ma²))), kPa. */
function pressureForm(v: Show, i: number, mach: string): string {
  return `10^{-3} \\, \\frac{${v(`G ${i}`)}}{${mach}} \\sqrt{\\frac{${v('Z')} \\cdot ${v('R')} \\cdot ${v('T0')}}{${v('M')} \\cdot ${v('k')} \\left(1 + \\frac{${v('k')}-1}{2} \\, ${mach}^2\\right)}}`;
}

const swell = (v: Show, mach: string) =>
  `\\left(1 + \\frac{${v('k')}-1}{2} \\, ${mach}^2\\right)^{${v('k')}/(${v('k')}-1)}`;

/** Static pressure at the end: sonic, that beyond it, or by the balance of the joint. */
function endPressureStep(segment: Segment): void {
  const { sheet, i, count, found, joint } = segment;
  const beyond = i === count - 1 ? 'P_exit_ambient' : `pin ${i + 1}`;
  const info = {
    ...named(segment, 'pout', 'p_{out}', 'static pressure at the end'),
    value: found.outlet / 1e3,
    unit: 'kPa_abs',
    clause: found.choked ? 'Mach 1: the flow needs more than the pressure beyond' : JOINTS[joint],
  };
  const [here, next] = [nameAt('D', i), nameAt('D', i + 1)];
  sheet.keep(`Maout ${i}`, found.machOut, symbolAt('Ma_{out}', i, count));
  sheet.step(info, (v) => {
    if (found.choked) return pressureForm(v, i, '1');
    if (joint === 'momentum')
      return `${v(beyond)} \\, \\frac{${v(next)}^2 \\left(1 + ${v('k')} \\cdot ${v(`Main ${i + 1}`)}^2\\right)}{${v(next)}^2 + ${v('k')} \\cdot ${v(here)}^2 \\cdot ${v(`Maout ${i}`)}^2}`;
    if (joint === 'reduction')
      return `${v(beyond)} \\, \\frac{${swell(v, v(`Main ${i + 1}`))}}{${swell(v, v(`Maout ${i}`))}}`;
    return v(beyond);
  });
}

function endMachSteps(segment: Segment): void {
  const { sheet, i, found } = segment;
  if (found.choked) {
    sheet.step(
      { ...named(segment, 'Maout', 'Ma_{out}', 'Mach number at the end'), value: 1, unit: '-' },
      () => '1',
    );
    return;
  }
  const m = found.machOut ** 2 * (1 + ((sheet.number('k', '-') - 1) / 2) * found.machOut ** 2);
  sheet.step(
    { ...named(segment, 'm', 'm', 'group of flux and end pressure'), value: m, unit: '-' },
    (v) =>
      `\\frac{10^{-6} \\cdot ${v(`G ${i}`)}^2 \\cdot ${v('Z')} \\cdot ${v('R')} \\cdot ${v('T0')}}{${v('M')} \\cdot ${v('k')} \\cdot ${v(`pout ${i}`)}^2}`,
  );
  sheet.step(
    { ...named(segment, 'Maout', 'Ma_{out}', 'Mach number at the end'), value: found.machOut, unit: '-' },
    (v) => `\\sqrt{\\frac{2 \\, ${v(`m ${i}`)}}{1 + \\sqrt{1 + 2 (${v('k')}-1) \\, ${v(`m ${i}`)}}}}`,
  );
}

function inletSteps(segment: Segment): void {
  const { sheet, i, found } = segment;
  const phi = (v: Show, mach: string) =>
    `\\frac{1 - ${mach}^2}{${v('k')} \\cdot ${mach}^2} + \\frac{${v('k')}+1}{2 \\, ${v('k')}} \\ln \\frac{(${v('k')}+1) \\, ${mach}^2}{2 + (${v('k')}-1) \\, ${mach}^2}`;
  const k = sheet.number('k', '-');
  const s = 1 / found.machOut ** 2;
  const value = (s - 1) / k + ((k + 1) / (2 * k)) * Math.log((k + 1) / (2 * s + k - 1));
  sheet.step(
    { ...named(segment, 'phi', '\\varphi_{out}', 'Fanno function at the end'), value, unit: '-' },
    (v) => phi(v, v(`Maout ${i}`)),
  );
  sheet.step(
    { ...named(segment, 'Main', 'Ma_{in}', 'Mach number at the beginning'), value: found.machIn, unit: '-' },
    (v) => `\\varphi^{-1}\\left(${v(`phi ${i}`)} + ${v(`N ${i}`)}\\right)`,
  );
  sheet.step(
    {
      ...named(segment, 'pin', 'p_{in}', 'static pressure at the beginning'),
      value: found.inlet / 1e3,
      unit: 'kPa_abs',
    },
    (v) => pressureForm(v, i, v(`Main ${i}`)),
  );
  sheet.step(
    {
      ...named(segment, 'Tout', 'T_{out}', 'static temperature at the end'),
      value: found.temperatureOut,
      unit: 'K',
    },
    (v) => `\\frac{${v('T0')}}{1 + \\frac{${v('k')}-1}{2} \\, ${v(`Maout ${i}`)}^2}`,
  );
}

/** Writes the steps and outputs of segment `i`; the flux, heads and what lies beyond must stand on the sheet. */
export function fannoSegmentSteps(
  sheet: SheetBuilder,
  i: number,
  count: number,
  { found, joint }: { found: AdiabaticSegment; joint: Joint },
): void {
  const segment: Segment = { sheet, i, count, found, joint };
  endPressureStep(segment);
  endMachSteps(segment);
  inletSteps(segment);
  segmentPressures(sheet, i, { inlet: found.inlet / 1e3, outlet: found.outlet / 1e3, choked: found.choked });
  sheet.output(`segment${i + 1}_outlet_Mach`, found.machOut);
  sheet.output(`segment${i + 1}_inlet_Mach`, found.machIn);
  sheet.output(`segment${i + 1}_outlet_temperature`, found.temperatureOut, 'K');
}
