/* Where the cubic equation with the data of the library is used at all. */
import { type Mixture } from './cubic/mixture';
import { at } from './cubic/vector';

/** Pressures of the library: above nought, to 100 MPa. */
export const P_LIMIT = 1e8;

/** The share of the lowest temperature of a heat capacity fit down to which its value is held. */
const HELD = 0.55;

/** Lowest and highest temperature, K: where the heat capacity of every substance present (more than a trace) is known. */
export function temperatureRange({ n, z, cp }: Mixture): { low: number; high: number } {
  let low = 10;
  let high = 3000;
  for (let i = 0; i < n; i += 1) {
    const fit = cp[i];
    if (fit === undefined || at(z, i) < 1e-6) continue;
    low = Math.max(low, HELD * fit.range[0]);
    high = Math.min(high, fit.range[1]);
  }
  return { low, high };
}

/** Whether a pressure in Pa is inside what is used. */
export function pressureInside(P: number): boolean {
  return P > 0 && P <= P_LIMIT;
}
