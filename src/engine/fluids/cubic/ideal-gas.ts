/* Heat capacity, enthalpy and entropy of an ideal gas from the polynomial of its heat capacity. */
import { type Correlation } from '../substances/types';
import { T_REFERENCE } from './constants';
import { at } from './vector';

/** cp/R, h/R (K) and s/R of one ideal gas at a temperature, h and s from nought at τ = 0 and τ = 1. */
export type IdealGas = { cp: number; h: number; s: number };

const inside = (fit: Correlation, T: number) => Math.min(Math.max(T, fit.range[0]), fit.range[1]);

function polynomial({ a }: Correlation, T: number, out: IdealGas): void {
  const t = T / 1000;
  let cp = 0;
  let h = 0;
  let s = 0;
  for (let k = a.length - 1; k >= 0; k -= 1) {
    const ak = at(a, k);
    cp = cp * t + ak;
    h = h * t + ak / (k + 1);
    if (k > 0) s = s * t + ak / k;
  }
  out.cp = cp;
  out.h = 1000 * t * h;
  out.s = at(a, 0) * Math.log(t) + t * s;
}

/** Fills `out` at T; beyond the range of the fit the heat capacity is held at its last value. */
export function idealGas(fit: Correlation, T: number, out: IdealGas): void {
  const held = inside(fit, T);
  polynomial(fit, held, out);
  if (held === T) return;
  out.h += out.cp * (T - held);
  out.s += out.cp * Math.log(T / held);
}

/** h/R and s/R at the reference temperature, to be taken off. */
export function idealGasReference(fit: Correlation): IdealGas {
  const out = { cp: 0, h: 0, s: 0 };
  idealGas(fit, T_REFERENCE, out);
  return out;
}
