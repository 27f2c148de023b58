/* Method g.outlet-homogeneous: back pressure of a line in which vapour and liquid flow together, on v(P) from points or from omega. */
import { type Method } from '../../catalog/types';
import {
  boreArea,
  marchedLine,
  omegaCurve,
  type VolumeCurve,
  volumeCurve,
  type VolumePoint,
} from '../../lines';
import { densityIntegral } from '../../lines/volume';
import { type SheetBuilder, workSheet } from '../../sheet';
import { optional, output } from '../common/describe';
import { absoluteIn } from '../common/pressures';
import { backPressureSteps, OUTLET_INPUTS, OUTLET_OUTPUTS, segmentOutputs, segmentPressures } from './outlet';
import { endPressure } from './pressures';
import { fluxStep, readSegments } from './read';
import { nameAt, ofSegment, readEach, symbolAt } from './series';

const CLAUSE = 'homogeneous flow with friction: N = (2/G²) ∫ρ dP − 2 ln(v₂/v₁)';
/** More points than a pasted table of an expansion has. */
const MOST_POINTS = 200;

/** The points of the table, or nothing when none was given. */
function readPoints(sheet: SheetBuilder): VolumePoint[] {
  const points: VolumePoint[] = [];
  for (let i = 0; i <= MOST_POINTS && sheet.has(nameAt('P_point', i)); i += 1) {
    const P = sheet.number(nameAt('P_point', i), 'kPa_abs', { above: 0 }) * 1e3;
    const v = sheet.number(nameAt('v_point', i), 'm3/kg', { above: 0 });
    points.push({ P, v });
  }
  return points;
}

/** The curve of the sheet: through its points, or the omega form from one state. */
export function readCurve(sheet: SheetBuilder): VolumeCurve {
  if (!sheet.has('P_point')) {
    const P0 = absoluteIn(sheet, 'P0', 'P_0', 'kPa_abs');
    const v0 = sheet.number('v0', 'm3/kg', { above: 0 }, 'v_0');
    const omega = sheet.number('omega', '-', { min: 0, max: 1000 }, '\\omega');
    return omegaCurve(P0 * 1e3, v0, omega);
  }
  const curve = volumeCurve(readPoints(sheet));
  return (
    curve ??
    sheet.refuse(
      'TABLE_UNFIT',
      'P_point',
      'The table needs at least two points at different pressures, with a specific volume that grows as the pressure falls.',
    )
  );
}

type Found = { inlet: number; outlet: number; choked: boolean; machOut: number; rises: boolean };

/** The steps of one segment; `curve` gives the integral that the checker may repeat on the points. */
function segmentSteps(sheet: SheetBuilder, i: number, count: number, found: Found, curve: VolumeCurve): void {
  const { rises } = found;
  const beyond = i === count - 1 ? 'P_exit_ambient' : `pin ${i + 1}`;
  const named = (key: string, tex: string, meaning: string) => ({
    key: `${key} ${i}`,
    tex: symbolAt(tex, i, count),
    meaning: `${meaning}${ofSegment(i, count)}`,
    clause: CLAUSE,
  });
  sheet.step(
    { ...named('pout', 'p_{out}', 'static pressure at the end'), value: found.outlet / 1e3, unit: 'kPa_abs' },
    (v) => (found.choked ? `p\\left(${v(`G ${i}`)} = 1/\\sqrt{-dv/dP}\\right)` : v(beyond)),
  );
  sheet.keep(`pin ${i}`, found.inlet / 1e3, symbolAt('p_{in}', i, count));
  sheet.step(
    {
      ...named('I', 'I', 'integral of density over pressure'),
      value: densityIntegral(curve, found.outlet, found.inlet) / 1e3,
      unit: '-',
    },
    (v) =>
      `\\int_{${v(`pout ${i}`)}}^{${v(`pin ${i}`)}} \\rho \\, dP \\quad \\left[\\text{kg·kPa/m}^3\\right]`,
  );
  sheet.step(
    {
      ...named('pin', 'p_{in}', 'static pressure at the beginning'),
      value: found.inlet / 1e3,
      unit: 'kPa_abs',
    },
    (v) =>
      `p: \\ \\frac{2 \\cdot 10^{3} \\, ${v(`I ${i}`)}}{${v(`G ${i}`)}^2} - 2 \\ln\\frac{v(${v(`pout ${i}`)})}{v(p)} = ${v(`N ${i}`)}${rises ? ' + \\frac{2 \\cdot 9.80665}{G^2} \\int \\rho^2 \\, dz' : ''}`,
  );
  sheet.step(
    { ...named('Ma', 'Ma', 'Mach number of the mixture at the end'), value: found.machOut, unit: '-' },
    (v) => `${v(`G ${i}`)} \\sqrt{-dv/dP}`,
  );
  segmentPressures(sheet, i, { inlet: found.inlet / 1e3, outlet: found.outlet / 1e3, choked: found.choked });
  sheet.output(`segment${i + 1}_outlet_Mach`, found.machOut);
}

/** g.outlet-homogeneous: back pressure of homogeneous equilibrium flow, marched from the end of the line. */
export const OUTLET_HOMOGENEOUS: Method = {
  id: 'g.outlet-homogeneous',
  version: 2,
  topic: 'g.outlet-homogeneous',
  title: 'Outlet line of a two-phase flow: back pressure',
  editions: ['textbook'],
  source:
    'One-dimensional homogeneous flow with friction (textbook; API 521 and the DIERS manual use the same model, from memory); omega form of API 520-1 Annex C (from memory)',
  validity:
    'Vapour and liquid at one velocity and in equilibrium; v(P) straight in 1/P between the points given, which should lie along the enthalpy of the relieved fluid; friction factor of the mixture as given or worked from the viscosity given. Slip and delayed flashing are left out.',
  inputs: [
    ...OUTLET_INPUTS,
    optional('P_point', 'pressure of a point of the expansion', 'pressure-absolute', { each: 'point' }),
    optional('v_point', 'specific volume of the mixture at that point', 'specific-volume', { each: 'point' }),
    optional('P0', 'pressure of the state from which omega counts', 'pressure-absolute'),
    optional('v0', 'specific volume of the mixture at that state', 'specific-volume'),
    optional('omega', 'omega of the mixture', 'dimensionless', { rangeKey: 'omega' }),
    optional('rise', 'height of the end of a segment above its beginning', 'length', {
      rangeKey: 'rise',
      each: 'segment',
    }),
  ],
  outputs: [
    ...segmentOutputs((s) => [
      output(`${s}_outlet_Mach`, 'Mach number of the mixture there', 'dimensionless'),
    ]),
    ...OUTLET_OUTPUTS,
  ],
  work(inputs, edition) {
    return workSheet(this, inputs, edition, (sheet) => {
      const curve = readCurve(sheet);
      const end = endPressure(sheet);
      const { count, D, W, N } = readSegments(sheet);
      const rise = readEach(sheet, 'rise', count, { unit: 'm', bounds: { fallback: 0 }, tex: 'h' });
      const segments = D.map((bore, i) => ({ D: bore, W: W[i] ?? 0, N: N[i] ?? 0, rise: rise[i] ?? 0 }));
      const worked = marchedLine(segments, curve, end * 1e3);
      if (!worked)
        return sheet.refuse(
          'NO_RESULT',
          'W',
          'No pressure was found from which this flow can come; check flow, bores and the table.',
        );
      for (let i = count - 1; i >= 0; i -= 1) {
        const found = worked[i];
        if (!found) continue;
        fluxStep(sheet, i, count, (W[i] ?? 0) / boreArea(D[i] ?? 1));
        segmentSteps(sheet, i, count, { ...found, rises: (rise[i] ?? 0) !== 0 }, curve);
      }
      const highest = Math.max(...worked.map((one) => one.machOut));
      backPressureSteps(sheet, {
        inlet: (worked[0]?.inlet ?? Number.NaN) / 1e3,
        end,
        mach: highest,
        chokes: worked.some((one) => one.choked),
      });
    });
  },
};
