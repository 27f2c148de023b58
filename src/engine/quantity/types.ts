/* What a quantity is: a number with a unit that says its dimension, gauge and absolute kept separate. */

/** A quantity as entered; `text` keeps what was typed, so that printed digits can be respected. */
export type Q = { value: number; unit: string; text?: string };

/** What a unit measures. Readings and differences, and gauge and absolute pressures, are different dimensions. */
export type Dimension =
  | 'pressure-gauge'
  | 'pressure-absolute'
  | 'pressure-difference'
  | 'temperature'
  | 'temperature-difference'
  | 'mass-flow'
  | 'volume-flow'
  | 'normal-volume-flow'
  | 'area'
  | 'length'
  | 'volume'
  | 'mass'
  | 'time'
  | 'velocity'
  | 'force'
  | 'molar-mass'
  | 'amount'
  | 'molar-flow'
  | 'specific-power'
  | 'density'
  | 'specific-volume'
  | 'viscosity'
  | 'saybolt-viscosity'
  | 'specific-energy'
  | 'molar-energy'
  | 'power'
  | 'heat-flux'
  | 'heat-conductance'
  | 'heat-conductivity'
  | 'heat-transfer-coefficient'
  | 'fouling-resistance'
  | 'temperature-rate'
  | 'pressure-rate'
  | 'pressure-per-temperature'
  | 'heat-capacity'
  | 'cubic-expansion'
  | 'compressibility'
  | 'mass-flux'
  | 'flow-coefficient'
  | 'gas-constant-c'
  | 'pump-curve'
  | 'sound-level'
  | 'angle'
  | 'rotation'
  | 'dimensionless';

/** The barometric pressure that ties gauge readings to absolute ones. */
export type QuantityContext = { barometer: Q };

/** Thrown when code mixes dimensions or names a unit that does not exist: always a bug, never user input. */
export class QuantityError extends Error {
  override readonly name = 'QuantityError';
}
