/* The hand calculation of a checker: published equations on her own readings, nothing of the program. */

export type Readings = {
  /** MAWP, bar gauge; barometer, bar. */
  mawp: number;
  barometer: number;
  /** Accumulation as a share of MAWP; 0.16 where several devices are installed (ASME BPVC Section VIII-1, UG-125). */
  accumulation: number;
  /** UA, kW/K; hot and cold side, °C; latent heat, kJ/kg. */
  ua: number;
  hot: number;
  cold: number;
  latent: number;
  /** Relieving temperature, K; compressibility; molar mass, kg/kmol; ideal heat-capacity ratio. */
  T: number;
  Z: number;
  M: number;
  k: number;
  /** Effective coefficient of discharge (0.975 for preliminary sizing of a valve, API Std 520 Part I). */
  Kd: number;
};
export type Worked = { limit: number; P1: number; load: number; area: number };

/**
 * Limit (bar gauge), P1 (bar absolute), load (kg/h), required area (mm²).
 *
 * The load is W = Q/λ with Q = UA·ΔT (API Std 521, heat input from an exchanger, vapour generated at relief); the area is the gas equation
 * in critical flow in SI units, A = W/(C·Kd·P1·Kb·Kc)·√(T·Z/M) with P1 in kPa (API Std 520 Part I, sizing for gas or vapour relief), Kb = Kc = 1.
 */
export function workByHand(of: Readings): Worked {
  const limit = of.mawp * (1 + of.accumulation);
  const P1 = limit + of.barometer;
  const load = ((of.ua * (of.hot - of.cold)) / of.latent) * 3600;
  const C = 0.03948 * Math.sqrt(of.k * (2 / (of.k + 1)) ** ((of.k + 1) / (of.k - 1)));
  const area = (load / (C * of.Kd * P1 * 100)) * Math.sqrt((of.T * of.Z) / of.M);
  return { limit, P1, load, area };
}

/** As one writes it down: four digits. */
export function fourDigits(value: number): string {
  return String(Number(value.toPrecision(4)));
}
