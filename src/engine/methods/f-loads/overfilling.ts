/* Methods f.overfilling and f.displacement: a vessel is filled to its relief device, or pushes out what it holds. */
import { type Method } from '../../catalog/types';
import { convert, fromSI } from '../../quantity';
import { type SheetBuilder, workSheet } from '../../sheet';
import { input, optional, output } from '../common/describe';
import { gaugePressure } from '../common/pressures';
import { pumpMassFlow, relievingGauge } from './blocked-outlet';
import { PUMP_CURVE_INPUTS, readPumpCurve } from './pump-curve';

/** Standard acceleration of gravity, m/s². */
export const GRAVITY = 9.80665;

/** Static head in kPa: kg/m³ and m. */
export function staticHead(rho: number, height: number): number {
  return (rho * GRAVITY * height) / 1000;
}

function headStep(
  sheet: SheetBuilder,
  rho: number,
  name: string,
  key: string,
  tex: string,
  words: string,
): number {
  const height = sheet.number(name, 'm', { fallback: 0 }, `h_{${tex}}`);
  sheet.keep('g', GRAVITY, 'g');
  return sheet.step(
    { key, tex: `\\Delta p_{${tex}}`, meaning: words, value: staticHead(rho, height), unit: 'kPa' },
    (v) => `\\frac{${v('rho')} \\cdot ${v('g')} \\cdot ${v(name)}}{1000}`,
  );
}

/** The flow: as given, or of the pump against the relieving pressure, the head to the device and its suction. */
function fillFlow(sheet: SheetBuilder, p1: number, rho: number): number {
  if (sheet.has('fill_rate')) return sheet.keep('Q', sheet.number('fill_rate', 'm3/h', { min: 0 }, 'Q'), 'Q');
  const suction = sheet.number('suction_pressure', 'kPa_g', {}, 'p_s');
  const head = headStep(
    sheet,
    rho,
    'device_above_pump',
    'dp1',
    'pump',
    'static head from the pump to the device',
  );
  const curve = readPumpCurve(sheet);
  const rise = sheet.step(
    {
      key: 'rise',
      tex: '\\Delta p',
      meaning: 'pressure rise that the pump must give',
      value: p1 + head - suction,
      unit: 'kPa',
    },
    (v) => `${v('P1')} + ${v('dp1')} - ${v('suction_pressure')}`,
  );
  return curve.flowStep(rise);
}

/** The pressure at the bottom of the liquid-full vessel, against its limit. */
function bottom(sheet: SheetBuilder, p1: number, rho: number): void {
  if (!sheet.has('device_above_bottom')) {
    sheet.warn(
      'BOTTOM_NOT_CHECKED',
      'The static head on the bottom was not checked: give device_above_bottom and the limit there.',
    );
    return;
  }
  const head = headStep(sheet, rho, 'device_above_bottom', 'dp2', 'bottom', 'static head on the bottom');
  const pressure = sheet.step(
    {
      key: 'pb',
      tex: 'p_{bottom}',
      meaning: 'pressure at the bottom when the device relieves',
      value: p1 + head,
      unit: 'kPa_g',
    },
    (v) => `${v('P1')} + ${v('dp2')}`,
  );
  sheet.output('bottom_pressure', pressure, 'kPa_g');
  if (!sheet.has('bottom_limit')) return;
  const limit = gaugePressure(sheet, 'bottom_limit', 'p_{lim}', 'SI');
  sheet.output('bottom_exceeded', pressure > limit);
  if (pressure > limit)
    sheet.warn(
      'BOTTOM_EXCEEDED',
      'Full of liquid, the bottom passes its limit while the device relieves: lower the set pressure or the level.',
    );
}

/** f.overfilling: liquid overfill of a vessel. */
export const OVERFILLING: Method = {
  id: 'f.overfilling',
  version: 1,
  topic: 'f.overfilling',
  title: 'Overfilling, with static head',
  editions: ['API 521, 5th to 7th edition (approach)'],
  source:
    'API Standard 521, overfilling: the filling rate at relieving pressure with the static head between pump, device and bottom (approach from memory); hydrostatics',
  validity:
    'Vessel and inlet line full of liquid at relief; pump on its curve, suction at its greatest and referred to the pump; losses of the line not credited; foundations are not judged here.',
  inputs: [
    optional('set_pressure', 'set pressure', 'pressure-gauge', { rangeKey: 'setPressure' }),
    optional('overpressure', 'overpressure as a fraction of set', 'dimensionless', {
      rangeKey: 'overpressure',
    }),
    optional('P1', 'relieving pressure, in place of set_pressure and overpressure', 'pressure-gauge'),
    optional('atmospheric_pressure', 'barometric pressure', 'pressure-absolute', { rangeKey: 'barometer' }),
    input('rho', 'liquid density', 'density', { rangeKey: 'liquidDensity' }),
    optional('fill_rate', 'filling rate at relief, in place of a pump curve', 'volume-flow', {
      rangeKey: 'pumpFlow',
    }),
    optional('suction_pressure', 'greatest suction pressure of the pump', 'pressure-gauge', {
      rangeKey: 'suction',
    }),
    ...PUMP_CURVE_INPUTS,
    optional('device_above_pump', 'height of the device above the pump (0 when not given)', 'length', {
      rangeKey: 'rise',
    }),
    optional('device_above_bottom', 'height of the device above the bottom of the vessel', 'length', {
      rangeKey: 'rise',
    }),
    optional('bottom_limit', 'pressure that the bottom may see', 'pressure-gauge'),
  ],
  outputs: [
    output('relief_flow', 'volume flow', 'volume-flow'),
    output('relief_load', 'relief load', 'mass-flow'),
    output('bottom_pressure', 'pressure at the bottom', 'pressure-gauge'),
    output('bottom_exceeded', 'whether the bottom passes its limit'),
  ],
  work(inputs, edition) {
    return workSheet(this, inputs, edition, (sheet) => {
      const p1 = relievingGauge(sheet);
      const rho = sheet.number('rho', 'kg/m3', { above: 0 }, '\\rho');
      const Q = fillFlow(sheet, p1, rho);
      sheet.output('relief_flow', Q, 'm3/h');
      pumpMassFlow(sheet, Q);
      bottom(sheet, p1, rho);
    });
  },
};

/** The inflow in m³/h: as a volume, or as a mass with the density it has at relieving pressure. */
function inflow(sheet: SheetBuilder): number {
  if (sheet.has('inflow')) return sheet.number('inflow', 'm3/h', { min: 0 }, 'Q_{in}');
  if (!sheet.has('W_in'))
    sheet.refuse('INPUT_MISSING', 'inflow', 'The inflow is missing: give inflow, or W_in with rho_in.');
  const W = sheet.number('W_in', 'kg/h', { min: 0 }, 'W_{in}');
  const rho = sheet.number('rho_in', 'kg/m3', { above: 0 }, '\\rho_{in}');
  return sheet.step(
    {
      key: 'inflow',
      tex: 'Q_{in}',
      meaning: 'volume flow of what comes in, at relieving pressure',
      value: W / rho,
      unit: 'm3/h',
    },
    (v) => `\\frac{${v('W_in')}}{${v('rho_in')}}`,
  );
}

/** f.displacement: what comes in pushes out what is there, volume for volume. */
export const DISPLACEMENT: Method = {
  id: 'f.displacement',
  version: 1,
  topic: 'f.displacement',
  title: 'Displacement by what comes in, volume for volume',
  editions: ['volume balance'],
  source:
    'Volume balance of a full vessel at relieving pressure: volume in = volume out (common practice, no source; API 521 uses it for gas that enters a liquid-full vessel, from memory)',
  validity:
    'Vessel full of what leaves; volumes at relieving pressure; nothing condenses, flashes or dissolves.',
  inputs: [
    optional('inflow', 'volume flow in at relieving pressure', 'volume-flow'),
    optional('W_in', 'mass flow in, in place of a volume', 'mass-flow', { rangeKey: 'reliefLoad' }),
    optional('rho_in', 'its density at relieving pressure', 'density'),
    input('rho', 'density of what is displaced, at relief', 'density'),
  ],
  outputs: [
    output('relief_flow', 'volume flow', 'volume-flow'),
    output('relief_load', 'relief load', 'mass-flow'),
  ],
  work(inputs, edition) {
    return workSheet(this, inputs, edition, (sheet) => {
      const Q = inflow(sheet);
      const rho = sheet.number('rho', 'kg/m3', { above: 0 }, '\\rho');
      const W = sheet.step(
        { key: 'W', meaning: 'relief load', value: Q * rho, unit: 'kg/h' },
        (v) => `${v('inflow')} \\cdot ${v('rho')}`,
      );
      const [flow, load] =
        sheet.quantity('rho').unit === 'lb/ft3' ? (['US gpm', 'lb/h'] as const) : (['m3/h', 'kg/h'] as const);
      sheet.output('relief_flow', convert({ value: Q, unit: 'm3/h' }, flow), flow);
      sheet.output('relief_load', fromSI(W / 3600, load).value, load);
    });
  },
};
