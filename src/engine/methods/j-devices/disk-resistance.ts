/* Method j.disk-resistance: what a line with a rupture disk lets out, the disk counted by its resistance KR. */
import { type Method } from '../../catalog/types';
import { pipeDischarge } from '../../lines';
import { convert, fromSI } from '../../quantity';
import { type SheetBuilder, workSheet } from '../../sheet';
import { GAS_INPUTS, input, optional, output, RELIEVING_INPUTS } from '../common/describe';
import { absolutePressure, barometer, relievingAbsolute } from '../common/pressures';
import { SYSTEM_UNITS, type System, systemOf } from '../common/system';

const CLAUSE = 'ASME XIII / VIII-1 UG-127(a)(2)(b); API 520-1, line-resistance method';

/** Resistance of a disk without a certified value: 2.4 (ASME VIII-1 UG-127, as public articles quote it). */
export const DEFAULT_KR = 2.4;

/** The share of the calculated capacity that counts (ASME VIII-1 UG-127(a)(2)(b), API 520-1; from memory). */
export const LINE_SHARE = 0.9;

/** Resistance of the line without its exit, in velocity heads of its bore. */
export type DiskLine = { D: number; L: number; f: number; entrance: number; fittings: number; KR: number };

/** Sum of the resistances: entrance, pipe, fittings and the disk. */
export function lineHeads({ D, L, f, entrance, fittings, KR }: DiskLine): number {
  return entrance + (f * L) / D + fittings + KR;
}

/** Flux of a liquid through N velocity heads and the head of its own exit, kg/(m²·s); 0 when nothing drives it. */
export function liquidLineFlux(P1: number, P2: number, rho: number, N: number): number {
  return Math.sqrt((2 * rho * Math.max(0, P1 - P2)) / (N + 1));
}

type Ends = { P1: number; P2: number };

/** Relieving and back pressure in Pa absolute; refuses when nothing can flow. */
function readEnds(sheet: SheetBuilder, system: System): Ends {
  const unit = SYSTEM_UNITS[system].P;
  const relieving = relievingAbsolute(sheet, system);
  const back = sheet.has('P2') ? absolutePressure(sheet, 'P2', 'P_2', system) : barometer(sheet, system);
  if (back >= relieving)
    sheet.refuse(
      'NO_FLOW',
      'P2',
      'The relieving pressure is not above the pressure at the end of the line: nothing can flow.',
    );
  return {
    P1: sheet.keep('P1', convert({ value: relieving, unit }, 'Pa_abs'), 'P_1'),
    P2: sheet.keep('P2', convert({ value: back, unit }, 'Pa_abs'), 'P_2'),
  };
}

function headsStep(sheet: SheetBuilder): { N: number; D: number } {
  const D = sheet.number('D', 'm', { above: 0 });
  const L = sheet.number('L', 'm', { min: 0 });
  const f = sheet.number('f_darcy', '-', { above: 0, max: 1 }, 'f');
  const entrance = sheet.number('K_entrance', '-', { min: 0, fallback: 0.5 }, 'K_e');
  const fittings = sheet.number('K_fittings', '-', { min: 0, fallback: 0 }, 'K_f');
  if (!sheet.has('K_R'))
    sheet.warn(
      'KR_ASSUMED',
      'No certified resistance of the disk is given: 2.4 velocity heads are taken (ASME); API 520-1 knows 1.5 for disks without certified value (from memory).',
    );
  const KR = sheet.number('K_R', '-', { min: 0, fallback: DEFAULT_KR }, 'K_R');
  const N = sheet.step(
    {
      key: 'N',
      meaning: 'resistance of line and disk, velocity heads',
      value: lineHeads({ D, L, f, entrance, fittings, KR }),
      unit: '-',
      clause: CLAUSE,
    },
    (v) =>
      `${v('K_entrance')} + \\frac{${v('f_darcy')} \\cdot ${v('L')}}{${v('D')}} + ${v('K_fittings')} + ${v('K_R')}`,
  );
  sheet.output('N', N);
  return { N, D };
}

function gasStep(sheet: SheetBuilder, N: number, { P1, P2 }: Ends): number {
  const T = sheet.number('T', 'K', { above: 0 });
  const Z = sheet.number('Z', '-', { above: 0 });
  const M = sheet.number('M', 'kg/kmol', { above: 0 });
  const k = sheet.number('k', '-', { above: 1 });
  const found = pipeDischarge(P1, { T, Z, M, k }, N, P2);
  if (!found)
    return sheet.refuse(
      'NO_RESULT',
      'K_R',
      'No flow was found that this line passes between these pressures.',
    );
  sheet.step(
    {
      key: 'M1',
      tex: 'Ma_1',
      meaning: `Mach number behind the entrance, ${found.choked ? 'choked at the end' : 'not choked at the end'}`,
      value: found.machIn,
      unit: '-',
      clause: 'adiabatic flow with friction (Fanno)',
    },
    (v) => `\\text{root of } \\phi(Ma_1, ${v('k')}) - \\phi(Ma_2, ${v('k')}) = ${v('N')}`,
  );
  sheet.output('choked', found.choked);
  sheet.output('Mach_in', found.machIn);
  return sheet.step(
    {
      key: 'G',
      meaning: 'mass flux in the bore, in SI base units',
      value: found.flux,
      unit: 'kg/(m2.s)',
      clause: 'isentropic entrance to the Mach number behind it',
    },
    (v) =>
      `\\frac{${v('P1')} \\cdot ${v('M1')} \\sqrt{\\frac{${v('k')} \\cdot ${v('M')}}{8314.46 \\cdot ${v('Z')} \\cdot ${v('T')}}}}{\\left(1 + \\frac{${v('k')}-1}{2} ${v('M1')}^2\\right)^{\\frac{${v('k')}+1}{2(${v('k')}-1)}}}`,
  );
}

function liquidStep(sheet: SheetBuilder, N: number, { P1, P2 }: Ends): number {
  const rho = sheet.number('rho', 'kg/m3', { above: 0 }, '\\rho');
  return sheet.step(
    {
      key: 'G',
      meaning: 'mass flux in the bore, in SI base units',
      value: liquidLineFlux(P1, P2, rho, N),
      unit: 'kg/(m2.s)',
      clause: 'pressure drop of the line and the velocity head at its end',
    },
    (v) => `\\sqrt{\\frac{2 \\cdot ${v('rho')} \\cdot (${v('P1')} - ${v('P2')})}{${v('N')} + 1}}`,
  );
}

function capacitySteps(sheet: SheetBuilder, flux: number, D: number, system: System): void {
  const { W: unit } = SYSTEM_UNITS[system];
  const flow = sheet.step(
    {
      key: 'Wc',
      tex: 'W_c',
      meaning: 'calculated flow through the line',
      value: (Math.PI / 4) * D ** 2 * flux,
      unit: 'kg/s',
    },
    (v) => `\\frac{\\pi}{4} ${v('D')}^2 \\cdot ${v('G')}`,
  );
  const W = sheet.step(
    {
      key: 'Wr',
      tex: 'W_r',
      meaning: 'capacity that counts',
      value: LINE_SHARE * flow,
      unit: 'kg/s',
      clause: CLAUSE,
      memory: true,
    },
    (v) => `${LINE_SHARE} \\cdot ${v('Wc')}`,
  );
  sheet.output('W_calculated', fromSI(flow, unit).value, unit);
  sheet.output('W_rated', fromSI(W, unit).value, unit);
  if (!sheet.has('W')) return;
  const wanted = sheet.number('W', 'kg/s', { above: 0 });
  sheet.output('use', wanted / W);
  sheet.output('suffices', wanted <= W);
}

/** j.disk-resistance: rupture disk in a line by the resistance method. */
export const DISK_RESISTANCE: Method = {
  id: 'j.disk-resistance',
  version: 1,
  topic: 'j.disk-resistance',
  title: 'Rupture disk in a line: capacity by the resistance KR',
  editions: ['ASME XIII:2021; ASME VIII-1, UG-127; API 520-1, 7th to 10th edition'],
  source:
    'ASME VIII-1 UG-127(a)(2)(b) and API Standard 520 Part I, line-resistance method, with 0.9 on the calculated flow (from memory); adiabatic flow with friction as in Perry’s handbook',
  validity:
    'One bore from the vessel to the end of the line; ideal gas with constant Z and k, or liquid that does not flash; KR certified for the same kind of fluid. Several bores or two phases: work the line on its own sheet with KR among the fittings.',
  inputs: [
    input('D', 'bore of the line', 'length', { rangeKey: 'bore' }),
    input('L', 'length of the line', 'length', { rangeKey: 'outletLength' }),
    input('f_darcy', 'Darcy friction factor', 'dimensionless', { rangeKey: 'frictionFactor' }),
    optional('K_entrance', 'resistance of the entrance (0.5 when not given)', 'dimensionless', {
      rangeKey: 'sumK',
    }),
    optional('K_fittings', 'sum of the resistances of fittings', 'dimensionless', { rangeKey: 'sumK' }),
    optional('K_R', 'certified resistance of the disk (2.4 when not given)', 'dimensionless', {
      rangeKey: 'kr',
    }),
    ...RELIEVING_INPUTS,
    optional(
      'P2',
      'pressure at the end of the line (the barometric pressure when not given)',
      'pressure-absolute',
    ),
    ...GAS_INPUTS.map((one) => ({ ...one, required: false })),
    optional('rho', 'density of the liquid; makes the sheet one of liquid', 'density', {
      rangeKey: 'liquidDensity',
    }),
    optional('W', 'required relief load, to be compared', 'mass-flow', { rangeKey: 'reliefLoad' }),
  ],
  outputs: [
    output('P1', 'relieving pressure', 'pressure-absolute'),
    output('N', 'resistance of line and disk, velocity heads', 'dimensionless'),
    output('choked', 'whether the end of the line is choked'),
    output('Mach_in', 'Mach number behind the entrance', 'dimensionless'),
    output('W_calculated', 'calculated flow', 'mass-flow'),
    output('W_rated', 'capacity that counts, 0.9 of it', 'mass-flow'),
    output('use', 'required load over the capacity', 'dimensionless'),
    output('suffices', 'whether the line passes the load'),
  ],
  work(inputs, edition) {
    return workSheet(this, inputs, edition, (sheet) => {
      const system = systemOf(inputs, ['D', 'W', 'P1', 'set_pressure']);
      const ends = readEnds(sheet, system);
      const { N, D } = headsStep(sheet);
      const liquid = sheet.has('rho') && !sheet.has('M');
      capacitySteps(sheet, liquid ? liquidStep(sheet, N, ends) : gasStep(sheet, N, ends), D, system);
    });
  },
};
