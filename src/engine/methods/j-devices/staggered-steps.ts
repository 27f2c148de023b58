/* The devices of a staggered group on their sheet: when each is full, what the fluid gives, what each passes. */
import { fromSI } from '../../quantity';
import { type SheetBuilder, type Show } from '../../sheet';
import { SYSTEM_UNITS, type System } from '../common/system';
import { nozzleFlux } from '../a-gas/flow';
import { fluxStep } from '../a-gas/rated';
import { liquidFlux } from './certified';
import { type FluxAt, fullOpening, type GroupDevice, passedBy, passedByAll, stateAt } from './staggered';

/** From where on a device is claimed. */
export const FULL_CLAUSE =
  'full capacity from 10 % overpressure on (ASME XIII: certified there); no credit for partial lift';

/** Most devices that one sheet takes. */
const MOST_DEVICES = 20;

/** A device with its tag and the suffix of its inputs and outputs. */
export type Named = GroupDevice & { suffix: string; tag: string };

function readDevice(sheet: SheetBuilder, n: number): Named {
  const suffix = n === 1 ? '' : `_${n}`;
  const set = sheet.number(`set_pressure${suffix}`, 'Pa_g', { above: 0 }, `p_{set,${n}}`);
  const A = sheet.number(`A_actual${suffix}`, 'm2', { above: 0 }, `A_{${n}}`);
  const K = sheet.number(`K_certified${suffix}`, '-', { above: 0, max: 1 }, `K_{${n}}`);
  const over = sheet.number('full_overpressure', '-', { min: 0, max: 1, fallback: 0.1 }, 'x_f');
  const full = sheet.step(
    {
      key: `full${n}`,
      tex: `p_{f,${n}}`,
      meaning: `pressure from which device ${n} is taken as fully open`,
      value: fullOpening(set, over),
      unit: 'Pa_g',
      clause: FULL_CLAUSE,
    },
    (v) =>
      `${v(`set_pressure${suffix}`)} + \\max(${v('full_overpressure')} \\cdot ${v(`set_pressure${suffix}`)},\\ 20\\,684)`,
  );
  const given = sheet.inputs[`tag${suffix}`];
  return { set, full, KA: K * A, suffix, tag: typeof given === 'string' ? given : `device ${n}` };
}

/** The devices in the order given: the first without, further ones with _2, _3 … */
export function readDevices(sheet: SheetBuilder): Named[] {
  const devices = [readDevice(sheet, 1)];
  while (devices.length < MOST_DEVICES && sheet.has(`set_pressure_${devices.length + 1}`))
    devices.push(readDevice(sheet, devices.length + 1));
  if (sheet.has(`set_pressure_${MOST_DEVICES + 1}`))
    sheet.refuse(
      'TOO_MANY_DEVICES',
      `set_pressure_${MOST_DEVICES + 1}`,
      `One sheet takes up to ${MOST_DEVICES} devices.`,
    );
  return devices;
}

/** The fluid at the inlets: flux by gauge pressure, and the step of it at one pressure. Pressures in Pa. */
export type GroupFluid = { fluxAt: FluxAt; step: (gauge: number) => number };

/** Reads the fluid, gas or liquid, between the atmosphere and the back pressure P2 in Pa absolute. */
export function readFluid(sheet: SheetBuilder, atmosphere: number, P2: number): GroupFluid {
  if (sheet.has('rho') && !sheet.has('M')) {
    const rho = sheet.number('rho', 'kg/m3', { above: 0 }, '\\rho');
    const fluxAt = (gauge: number) => liquidFlux(gauge + atmosphere, P2, rho);
    const tex = (v: Show) => `\\sqrt{2 \\cdot ${v('rho')} \\cdot (${v('p')} + ${v('patm')} - ${v('P2')})}`;
    return { fluxAt, step: (gauge) => stillStep(sheet, fluxAt(gauge), tex) };
  }
  const gas = {
    P2,
    T: sheet.number('T', 'K', { above: 0 }),
    Z: sheet.number('Z', '-', { above: 0 }),
    M: sheet.number('M', 'kg/kmol', { above: 0 }),
    k: sheet.number('k', '-', { min: 1 }),
  };
  const fluxAt = (gauge: number) => nozzleFlux({ P1: gauge + atmosphere, ...gas }).flux;
  const step = (gauge: number) =>
    gauge + atmosphere > P2
      ? fluxStep(sheet, { P1: gauge + atmosphere, ...gas }).flux
      : stillStep(sheet, 0, () => '0');
  return { fluxAt, step };
}

/** The flux of a liquid, or of anything that nothing drives. */
function stillStep(sheet: SheetBuilder, value: number, tex: (v: Show) => string): number {
  const flux = value === 0 ? () => '0' : tex;
  return sheet.step(
    { key: 'G', meaning: 'theoretical mass flux at the pressure asked', value, unit: 'kg/(m2.s)' },
    flux,
  );
}

/** What each device does at the pressure asked. */
export function stateSteps(
  sheet: SheetBuilder,
  devices: readonly Named[],
  gauge: number,
  fluid: GroupFluid,
  system: System,
): void {
  const flux = fluid.fluxAt;
  const { W: unit } = SYSTEM_UNITS[system];
  fluid.step(gauge);
  devices.forEach((device, i) => {
    const state = stateAt(device, gauge);
    const W = passedBy(device, gauge, flux);
    sheet.output(`state${device.suffix}`, state);
    sheet.output(
      `full_open_pressure${device.suffix}`,
      fromSI(device.full, SYSTEM_UNITS[system].Pg).value,
      SYSTEM_UNITS[system].Pg,
    );
    sheet.step(
      {
        key: `W${i + 1}`,
        tex: `W_{${i + 1}}`,
        meaning: `passed by ${device.tag}, ${state}`,
        value: W,
        unit: 'kg/s',
        clause: FULL_CLAUSE,
      },
      (v) =>
        W === 0
          ? '0'
          : `${v(`K_certified${device.suffix}`)} \\cdot ${v(`A_actual${device.suffix}`)} \\cdot ${v('G')}`,
    );
    sheet.output(`passed${device.suffix}`, fromSI(W, unit).value, unit);
  });
  const total = sheet.step(
    { key: 'Wt', tex: 'W', meaning: 'passed by all', value: passedByAll(devices, gauge, flux), unit: 'kg/s' },
    (v) => devices.map((_, i) => v(`W${i + 1}`)).join(' + '),
  );
  sheet.output('total_passed', fromSI(total, unit).value, unit);
  if (devices.some((one) => stateAt(one, gauge) === 'opening'))
    sheet.warn(
      'PARTLY_OPEN',
      'A device stands between its set and its full opening: it will pass something, which is not claimed here for want of a certified lift curve.',
    );
}
