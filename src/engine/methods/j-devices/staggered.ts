/* Bare arithmetic of several devices with staggered sets: who is open at a pressure, what all pass, and where they pass a load. */
import { findRoot } from '../../numeric';

/** A device of a group: set and full opening (Pa gauge), certified coefficient × actual area (m²). */
export type GroupDevice = { set: number; full: number; KA: number };

/** Theoretical flux of the fluid at a gauge pressure, kg/(m²·s); rises with the pressure. */
export type FluxAt = (gauge: number) => number;

/** Floor of the overpressure at full opening, Pa: 3 psi. */
export const FULL_FLOOR = 3 * 6894.757293168;

/** Pressure from which a device is taken as fully open: set and overpressure, or set and its floor where that is more. */
export function fullOpening(set: number, overpressure: number): number {
  return set + Math.max(overpressure * set, FULL_FLOOR);
}

/** Shut below its set, opening up to its full opening (nothing is claimed there), then full. */
export function stateAt(device: GroupDevice, gauge: number): 'shut' | 'opening' | 'full' {
  if (gauge < device.set) return 'shut';
  return gauge < device.full ? 'opening' : 'full';
}

/** What one device is claimed to pass at a gauge pressure, kg/s. */
export function passedBy(device: GroupDevice, gauge: number, flux: FluxAt): number {
  return stateAt(device, gauge) === 'full' ? device.KA * flux(gauge) : 0;
}

/** What all devices are claimed to pass at a gauge pressure, kg/s; never falls as the pressure rises. */
export function passedByAll(devices: readonly GroupDevice[], gauge: number, flux: FluxAt): number {
  return devices.reduce((sum, one) => sum + passedBy(one, gauge, flux), 0);
}

/**
 * The lowest gauge pressure in Pa at which the devices pass a load (kg/s), searched up to `most`; undefined when they do not.
 * Between two full openings the flow rises steadily, at each of them it jumps.
 */
export function pressureFor(
  devices: readonly GroupDevice[],
  load: number,
  flux: FluxAt,
  most: number,
): number | undefined {
  const steps = [...new Set(devices.map((one) => one.full))]
    .filter((full) => full <= most)
    .sort((a, b) => a - b);
  for (const [i, from] of steps.entries()) {
    if (passedByAll(devices, from, flux) >= load) return from;
    const open = devices.filter((one) => one.full <= from);
    const short = (gauge: number) => passedByAll(open, gauge, flux) - load;
    const to = steps[i + 1] ?? most;
    if (short(to) < 0) continue;
    const found = findRoot(short, from, to);
    return found.ok ? found.x : undefined;
  }
  return undefined;
}
