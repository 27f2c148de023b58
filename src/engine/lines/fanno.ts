/* Adiabatic flow of an ideal gas with friction (Fanno), in s = 1/Ma², where the friction function is convex and safe to invert. */

/** The Fanno function f L/D to Mach 1 (in velocity heads, Darcy f) at s = 1/Ma² > 0. */
export function fannoOfS(s: number, k: number): number {
  return (s - 1) / k + ((k + 1) / (2 * k)) * Math.log((k + 1) / (2 * s + k - 1));
}

/** The Fanno function f L/D to Mach 1 (Darcy f; tables print it as 4 f L*:D with the Fanning f), at Mach > 0. Textbook. */
export function fannoFunction(mach: number, k: number): number {
  return fannoOfS(1 / mach ** 2, k);
}

/** Static pressure over that at Mach 1 on a Fanno line. Textbook. */
export function fannoPressureRatio(mach: number, k: number): number {
  return Math.sqrt((k + 1) / (2 + (k - 1) * mach ** 2)) / mach;
}

/** Fewer velocity heads than this are none: the friction function cannot tell them apart in double precision. */
const LEAST_HEADS = 1e-14;

/**
 * The s = 1/Ma² that lies N velocity heads upstream of `from`. Newton from below the root jumps above it and then comes down
 * monotonically, the function being convex; 60 rounds at most.
 */
export function fannoUpstream(from: number, N: number, k: number): number {
  if (!(N > LEAST_HEADS)) return from;
  const target = fannoOfS(from, k) + N;
  let s = from + k * N;
  for (let round = 0; round < 60; round += 1) {
    const slope = (2 * s - 2) / (k * (2 * s + k - 1));
    const step = (fannoOfS(s, k) - target) / slope;
    s -= step;
    if (Math.abs(step) <= 1e-14 * s) break;
  }
  return s;
}

/** Ma² from static pressure, flux and stagnation temperature: m = G² Z R T0/(M k p²) = Ma² (1 + (k−1)/2 Ma²). */
export function machSquared(m: number, k: number): number {
  return (2 * m) / (1 + Math.sqrt(1 + 2 * (k - 1) * m));
}

/** Stagnation over static temperature, 1 + (k−1)/2 Ma². */
export function temperatureRatio(mach2: number, k: number): number {
  return 1 + ((k - 1) / 2) * mach2;
}

/** Stagnation over static pressure of an isentropic change, (1 + (k−1)/2 Ma²)^(k/(k−1)); its limit at k = 1. */
export function stagnationRatio(mach2: number, k: number): number {
  if (k - 1 < 1e-7) return Math.exp(mach2 / 2);
  return temperatureRatio(mach2, k) ** (k / (k - 1));
}
