/* Method j.low-lift: flow area of a device by its lift, curtain area against bore, with a restricted lift. */
import { type Method } from '../../catalog/types';
import { fromSI } from '../../quantity';
import { type SheetBuilder, workSheet } from '../../sheet';
import { input, optional, output } from '../common/describe';
import { SYSTEM_UNITS, type System, systemOf } from '../common/system';
import { boreAreaOf, curtainArea, flowAreaOf, leastRestricted, type Seat, SEAT_FACTORS } from './lift';

const CLAUSE = 'ASME VIII-1 UG-131(d), curtain of a flat or 45° seat; API 520-1, full-lift and low-lift';
const SEATS = Object.keys(SEAT_FACTORS) as Seat[];

/** Areas of curtain and bore in m², with the smaller one; gives their outputs. */
function areaSteps(sheet: SheetBuilder, system: System): number {
  const bore = sheet.number('bore_diameter', 'm', { above: 0 }, 'd_0');
  const seatDiameter = sheet.number('seat_diameter', 'm', { above: 0, fallback: bore }, 'd_s');
  const lift = sheet.number('lift', 'm', { above: 0 }, 'h');
  const seat = sheet.word('seat', SEATS, 'flat');
  if (seatDiameter < bore)
    sheet.refuse(
      'SEAT_BELOW_BORE',
      'seat_diameter',
      'The seat is smaller than the bore of the nozzle: take the smallest diameter of the flow path as the bore.',
    );
  const factor = SEAT_FACTORS[seat];
  const curtain = sheet.step(
    {
      key: 'Ac',
      tex: 'A_c',
      meaning: 'curtain area at the lift',
      value: curtainArea(seatDiameter, lift, seat),
      unit: 'm2',
      clause: CLAUSE,
      memory: true,
    },
    (v) => `${factor === 1 ? '' : `${factor} \\cdot `}\\pi \\cdot ${v('seat_diameter')} \\cdot ${v('lift')}`,
  );
  const nozzle = sheet.step(
    { key: 'A0', tex: 'A_0', meaning: 'bore area of the nozzle', value: boreAreaOf(bore), unit: 'm2' },
    (v) => `\\frac{\\pi}{4} ${v('bore_diameter')}^2`,
  );
  const { area, by } = flowAreaOf(curtain, nozzle);
  sheet.step(
    { key: 'A', meaning: `flow area, that of the ${by}`, value: area, unit: 'm2', clause: CLAUSE },
    (v) => `\\min(${v('Ac')},\\ ${v('A0')})`,
  );
  const { A: unit } = SYSTEM_UNITS[system];
  for (const [name, value] of Object.entries({ curtain_area: curtain, bore_area: nozzle, flow_area: area }))
    sheet.output(name, fromSI(value, unit).value, unit);
  sheet.output('limited_by', by);
  sheet.output('kind', by === 'curtain' ? 'low-lift' : 'full-lift');
  sheet.output('lift_ratio', lift / bore);
  return area;
}

/** Checks a lift restricted below the full lift of the design. */
function restriction(sheet: SheetBuilder): void {
  if (!sheet.has('full_lift')) return;
  const lift = sheet.number('lift', 'm', { above: 0 }, 'h');
  const full = sheet.number('full_lift', 'm', { above: 0 }, 'h_{full}');
  if (lift > full * (1 + 1e-9))
    sheet.refuse('LIFT_ABOVE_FULL', 'lift', 'The lift is above the full lift of the design.');
  const least = sheet.step(
    {
      key: 'hmin',
      tex: 'h_{min}',
      meaning: 'least restricted lift',
      value: leastRestricted(full),
      unit: 'm',
      clause: 'ASME XIII, restricted lift',
      memory: true,
    },
    (v) => `\\max(0.3 \\cdot ${v('full_lift')},\\ 0.002)`,
  );
  const holds = lift >= Math.min(least, full) * (1 - 1e-9);
  sheet.output('restriction_allowed', holds);
  if (!holds)
    sheet.warn(
      'LIFT_TOO_SMALL',
      'The lift is restricted below 30 % of the full lift or below 2 mm (0.080 in): such a device may not be certified.',
    );
}

/** j.low-lift: flow area by lift. */
export const LOW_LIFT: Method = {
  id: 'j.low-lift',
  version: 1,
  topic: 'j.low-lift',
  title: 'Flow area by lift: curtain or bore',
  editions: ['ASME XIII:2021; ASME VIII-1, UG-131', 'EN ISO 4126-1:2013'],
  source:
    'Geometry of seat and bore; factors of seats after ASME VIII-1 UG-131(d) and limits of restricted lift after ASME XIII, from memory',
  validity:
    'Geometric area at the lift that the device reaches at its rated overpressure; its certified coefficient must refer to this same area.',
  inputs: [
    input('bore_diameter', 'smallest diameter of the flow path below the seat', 'length'),
    optional('seat_diameter', 'diameter of the seat (that of the bore when not given)', 'length'),
    input('lift', 'lift at rated overpressure', 'length', { rangeKey: 'lift' }),
    optional('seat', 'kind of seat (flat when not given)', undefined, { words: [...SEATS] }),
    optional('full_lift', 'full lift of the design, where the lift is restricted', 'length', {
      rangeKey: 'lift',
    }),
    optional('K_certified', 'certified coefficient on this area', 'dimensionless', { rangeKey: 'kdGas' }),
  ],
  outputs: [
    output('curtain_area', 'curtain area', 'area'),
    output('bore_area', 'bore area', 'area'),
    output('flow_area', 'flow area', 'area'),
    output('limited_by', 'curtain or bore'),
    output('kind', 'low-lift or full-lift'),
    output('lift_ratio', 'lift over bore diameter', 'dimensionless'),
    output('restriction_allowed', 'whether the restricted lift may be certified'),
    output('K_times_A', 'certified coefficient × flow area', 'area'),
  ],
  work(inputs, edition) {
    return workSheet(this, inputs, edition, (sheet) => {
      const system = systemOf(inputs, ['bore_diameter', 'lift']);
      const area = areaSteps(sheet, system);
      restriction(sheet);
      if (!sheet.has('K_certified')) return;
      const K = sheet.number('K_certified', '-', { above: 0, max: 1 }, 'K');
      const KA = sheet.step(
        {
          key: 'KA',
          tex: 'K\\!A',
          meaning: 'certified coefficient × flow area',
          value: K * area,
          unit: 'm2',
        },
        (v) => `${v('K_certified')} \\cdot ${v('A')}`,
      );
      const { A: unit } = SYSTEM_UNITS[system];
      sheet.output('K_times_A', fromSI(KA, unit).value, unit);
    });
  },
};
