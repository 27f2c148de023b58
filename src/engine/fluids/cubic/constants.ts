/* Constants of the Peng–Robinson equation, from its condition at the critical point. */

/** Molar gas constant, J/(kmol·K) (CODATA 2018). */
export const R = 8314.462618;

/** Root of the critical condition: covolume over critical volume. */
const ETA = 1 / (1 + Math.cbrt(4 - Math.SQRT2 * 2) + Math.cbrt(4 + Math.SQRT2 * 2));

/** Ω_a of a_c = Ω_a (R Tc)²/Pc; 0.457236 in the paper of 1976. */
export const OMEGA_A = (8 * (5 * ETA + 1)) / (49 - 37 * ETA);
/** Ω_b of b = Ω_b R Tc/Pc; 0.077796 in the paper of 1976. */
export const OMEGA_B = ETA / (ETA + 3);

/** Critical volume over covolume: what a single root is judged by, liquid-like below, vapour-like above. */
export const CRITICAL_VOLUME = 1 / ETA;

/** δ1 of the attractive denominator (V + δ1 B)(V + δ2 B) = V² + 2BV − B². */
export const DELTA1 = 1 + Math.SQRT2;
/** δ2 of the same. */
export const DELTA2 = 1 - Math.SQRT2;

/** Temperature at which the enthalpy of every ideal gas is nought, K. */
export const T_REFERENCE = 298.15;
/** Pressure at which, at that temperature, its entropy is nought, Pa. */
export const P_REFERENCE = 1e5;
