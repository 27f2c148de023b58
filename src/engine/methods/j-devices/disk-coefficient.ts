/* Method j.disk-coefficient: a rupture disk alone by the flow coefficient 0.62, with the conditions under which that may be used. */
import { type Method } from '../../catalog/types';
import { convert, fromSI } from '../../quantity';
import { type SheetBuilder, workSheet } from '../../sheet';
import { GAS_INPUTS, optional, output, RELIEVING_INPUTS } from '../common/describe';
import { absolutePressure, barometer, relievingAbsolute } from '../common/pressures';
import { SYSTEM_UNITS, type System, systemOf } from '../common/system';
import { fluxStep, readState } from '../a-gas/rated';
import { liquidFlux } from './certified';

const CLAUSE = 'ASME XIII / VIII-1 UG-127(a)(2)(a); API 520-1, coefficient of discharge method';

/** Coefficient of a rupture disk on its minimum net flow area (ASME VIII-1 UG-127, API 520-1; quoted in public articles). */
export const DISK_COEFFICIENT = 0.62;

/** Longest inlet and discharge within which the coefficient serves, in pipe diameters (as a public handbook quotes ASME). */
export const INLET_DIAMETERS = 8;
/** The same for the discharge. */
export const DISCHARGE_DIAMETERS = 5;

/** The load in kg/s, as a mass flow or as a volume of liquid. */
function readLoad(sheet: SheetBuilder, liquid: boolean): number {
  if (!liquid || sheet.has('W')) return sheet.number('W', 'kg/s', { above: 0 });
  const Q = sheet.number('Q', 'm3/s', { above: 0 }, 'Q');
  const rho = sheet.number('rho', 'kg/m3', { above: 0 }, '\\rho');
  return sheet.step(
    { key: 'W', meaning: 'mass flow of the liquid', value: Q * rho, unit: 'kg/s' },
    (v) => `${v('Q')} \\cdot ${v('rho')}`,
  );
}

function liquidStep(sheet: SheetBuilder, system: System): number {
  const rho = sheet.number('rho', 'kg/m3', { above: 0 }, '\\rho');
  const unit = SYSTEM_UNITS[system].P;
  const relieving = relievingAbsolute(sheet, system);
  const back = sheet.has('P2') ? absolutePressure(sheet, 'P2', 'P_2', system) : barometer(sheet, system);
  if (back >= relieving)
    sheet.refuse('NO_FLOW', 'P2', 'The relieving pressure is not above the back pressure: nothing can flow.');
  const P1 = sheet.keep('P1', convert({ value: relieving, unit }, 'Pa_abs'), 'P_1');
  const P2 = sheet.keep('P2', convert({ value: back, unit }, 'Pa_abs'), 'P_2');
  return sheet.step(
    {
      key: 'G',
      meaning: 'theoretical mass flux of the liquid, in SI base units',
      value: liquidFlux(P1, P2, rho),
      unit: 'kg/(m2.s)',
      clause: CLAUSE,
    },
    (v) => `\\sqrt{2 \\cdot ${v('rho')} \\cdot (${v('P1')} - ${v('P2')})}`,
  );
}

/** Whether the coefficient may be used; one warning for each condition that is not met or not said. */
function conditions(sheet: SheetBuilder): boolean {
  const atmosphere = sheet.flag('to_atmosphere', false);
  if (!atmosphere)
    sheet.warn(
      'NOT_TO_ATMOSPHERE',
      'The disk is not said to discharge directly to the atmosphere: use the line-resistance method.',
    );
  const bore = sheet.has('pipe_bore') ? sheet.number('pipe_bore', 'm', { above: 0 }, 'D') : undefined;
  const within = (name: string, tex: string, limit: number): boolean => {
    if (bore === undefined || !sheet.has(name)) {
      sheet.warn(
        'LENGTHS_NOT_GIVEN',
        `The ${name === 'inlet_length' ? 'distance from the vessel' : 'length of the discharge'} is not given: it must be within ${limit} pipe diameters.`,
      );
      return false;
    }
    const length = sheet.number(name, 'm', { min: 0 }, tex);
    const short = length <= limit * bore * (1 + 1e-9);
    if (!short)
      sheet.warn(
        'LINE_TOO_LONG',
        `${name === 'inlet_length' ? 'The disk is more than 8' : 'The discharge is longer than 5'} pipe diameters: use the line-resistance method.`,
      );
    return short;
  };
  const inlet = within('inlet_length', 'L_i', INLET_DIAMETERS);
  const discharge = within('discharge_length', 'L_d', DISCHARGE_DIAMETERS);
  return atmosphere && inlet && discharge;
}

/** j.disk-coefficient: rupture disk alone by the coefficient method. */
export const DISK_COEFFICIENT_METHOD: Method = {
  id: 'j.disk-coefficient',
  version: 1,
  topic: 'j.disk-coefficient',
  title: 'Rupture disk alone: required net flow area by the coefficient 0.62',
  editions: ['ASME XIII:2021; ASME VIII-1, UG-127; API 520-1, 7th to 10th edition'],
  source:
    'ASME VIII-1 UG-127(a)(2)(a) and API Standard 520 Part I: coefficient 0.62 on the minimum net flow area, within 8 diameters of the vessel and 5 of discharge to the atmosphere, as the Valve Selection Handbook, p. 275, quotes them',
  validity:
    'Ideal-gas nozzle, or liquid that does not flash; minimum net flow area after bursting, not above the area of the pipe. Beyond the stated lengths, or into a closed system, the line-resistance method applies.',
  inputs: [
    optional('W', 'required relief load', 'mass-flow', { rangeKey: 'reliefLoad' }),
    optional('Q', 'required load of liquid as a volume, in place of W', 'volume-flow'),
    ...GAS_INPUTS.map((one) => ({ ...one, required: false })),
    optional('rho', 'density of the liquid; makes the sheet one of liquid', 'density', {
      rangeKey: 'liquidDensity',
    }),
    ...RELIEVING_INPUTS,
    optional('P2', 'total back pressure (the barometric pressure when not given)', 'pressure-absolute'),
    optional('Kd', 'coefficient of the disk (0.62 when not given)', 'dimensionless', {
      rangeKey: 'kdLiquid',
    }),
    optional('net_area', 'minimum net flow area of the disk, to be compared', 'area', {
      rangeKey: 'orificeArea',
    }),
    optional('pipe_bore', 'bore of the pipe at the disk', 'length', { rangeKey: 'bore' }),
    optional('inlet_length', 'distance of the disk from the vessel', 'length', { rangeKey: 'inletLength' }),
    optional('discharge_length', 'length of the discharge pipe', 'length', { rangeKey: 'outletLength' }),
    optional('to_atmosphere', 'whether the disk discharges directly to the atmosphere (no when not given)'),
  ],
  outputs: [
    output('P1', 'relieving pressure', 'pressure-absolute'),
    output('A_required', 'required net flow area', 'area'),
    output('method_allowed', 'whether the conditions of the coefficient are met'),
    output('area_used', 'net flow area that counts', 'area'),
    output('suffices', 'whether the disk is large enough'),
  ],
  work(inputs, edition) {
    return workSheet(this, inputs, edition, (sheet) => {
      const system = systemOf(inputs, ['W', 'Q', 'P1', 'set_pressure']);
      const liquid = sheet.has('rho') && !sheet.has('M');
      const W = readLoad(sheet, liquid);
      const flux = liquid ? liquidStep(sheet, system) : fluxStep(sheet, readState(sheet, system)).flux;
      const Kd = sheet.number('Kd', '-', { above: 0, max: 1, fallback: DISK_COEFFICIENT }, 'K_d');
      const A = sheet.step(
        { key: 'A', meaning: 'required net flow area', value: W / (Kd * flux), unit: 'm2', clause: CLAUSE },
        (v) => `\\frac{${v('W')}}{${v('Kd')} \\cdot ${v('G')}}`,
      );
      const { A: unit } = SYSTEM_UNITS[system];
      sheet.output('A_required', fromSI(A, unit).value, unit);
      const allowed = conditions(sheet);
      sheet.output('method_allowed', allowed);
      sheet.say({
        symbol: '\\text{method}',
        meaning: allowed
          ? 'the conditions of the coefficient are met'
          : 'the conditions of the coefficient are not all met; see the warnings',
        value: allowed ? 'allowed' : 'not shown to be allowed',
        tex: `L_i \\le ${INLET_DIAMETERS} D,\\ L_d \\le ${DISCHARGE_DIAMETERS} D,\\ \\text{to the atmosphere}`,
        clause: CLAUSE,
      });
      compare(sheet, A, unit);
    });
  },
};

/** Compares the disk with the requirement; its net area does not count beyond that of the pipe. */
function compare(sheet: SheetBuilder, required: number, unit: string): void {
  if (!sheet.has('net_area')) return;
  const net = sheet.number('net_area', 'm2', { above: 0 }, 'A_n');
  const bore = sheet.has('pipe_bore') ? sheet.number('pipe_bore', 'm', { above: 0 }, 'D') : undefined;
  const used = bore === undefined ? net : Math.min(net, (Math.PI / 4) * bore ** 2);
  sheet.step(
    { key: 'Au', tex: 'A_u', meaning: 'net flow area that counts', value: used, unit: 'm2', clause: CLAUSE },
    (v) =>
      bore === undefined
        ? v('net_area')
        : `\\min\\left(${v('net_area')},\\ \\frac{\\pi}{4} ${v('pipe_bore')}^2\\right)`,
  );
  sheet.output('area_used', fromSI(used, unit).value, unit);
  sheet.output('suffices', used >= required);
}
