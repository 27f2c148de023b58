/* The air in which tank vents are rated: its mass by normal volume, and a gas as the air that asks the same of a vent. */

/** Molar mass of dry air, kg/kmol, as the venting equations of ISO 28300 and API 2000 round it (from memory). */
export const AIR_MOLAR_MASS = 28.96;

/** Ratio of specific heats of air. */
export const AIR_K = 1.4;

/** Volume of a kmol of ideal gas at 0 °C and 101.325 kPa, m³ (CODATA 2018). */
export const NORMAL_VOLUME = 22.413969545;

/** Temperature of normal air, K. */
export const NORMAL_TEMPERATURE = 273.15;

/** Mass of a flow of air in kg/s, from normal cubic metres a second. */
export function airMass(volume: number): number {
  return (volume * AIR_MOLAR_MASS) / NORMAL_VOLUME;
}

/** Normal cubic metres of air a second in a mass flow of air, kg/s. */
export function airVolume(mass: number): number {
  return (mass * NORMAL_VOLUME) / AIR_MOLAR_MASS;
}

/**
 * The flow of air, Nm³/s, that asks the same area of a vent as a mass flow of gas (kg/s) at the same pressures and at the
 * reference temperature: its normal volume times the root of the ratio of molar masses. M in kg/kmol, above 0.
 */
export function airEquivalent(mass: number, M: number): number {
  return ((mass * NORMAL_VOLUME) / M) * Math.sqrt(M / AIR_MOLAR_MASS);
}
