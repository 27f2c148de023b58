/* Constants of the Peng–Robinson equation, from its condition at the critical point. */

/** Molar gas constant, J/(kmol·K) (CODATA 2018). */
export const R = 8314.462618;

/** Root of the critical condition: covolume over critical volume. */
const ETA = 1 / (1 + Math.cbrt(4 - Math.SQRT2 * 2) + Math.cbrt(4 + Math.SQRT2 * 2));

/** Ω_a and Ω_b: a_c = Ω_a (R Tc)²/Pc, b = Ω_b R Tc/Pc (0.457236 and 0.077796 in the paper of 1976). */
export const OMEGA_A = (8 * (5 * ETA + 1)) / (49 - 37 * ETA);
export const OMEGA_B = ETA / (ETA + 3);

/** Critical volume over covolume: what a single root is judged by, liquid-like below, vapour-like above. */
export const CRITICAL_VOLUME = 1 / ETA;

/** The two constants of the attractive denominator (V + δ1 B)(V + δ2 B) = V² + 2BV − B². */
export const DELTA1 = 1 + Math.SQRT2;
export const DELTA2 = 1 - Math.SQRT2;

/** Temperature and pressure at which enthalpy and entropy of every ideal gas are nought. */
export const T_REFERENCE = 298.15;
export const P_REFERENCE = 1e5;
