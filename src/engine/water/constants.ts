/* Reference constants and limits of the industrial formulation: IAPWS R7-97(2012), sections 2 and 3. */

/** Specific gas constant, J/(kg·K), Eq. (1). */
export const R = 461.526;

/** Molar mass, kg/kmol, that belongs to the specific gas constant. */
export const MOLAR_MASS = 18.015257;

/** Critical point: Pa, K, kg/m³, Eqs. (2) to (4). */
export const CRITICAL = { P: 22.064e6, T: 647.096, rho: 322 } as const;

/** Temperatures that bound the regions, K: the lowest, regions 1 | 3, the end of 2 | 3, regions 2 | 5, the highest. */
export const LIMITS_T = { lowest: 273.15, one: 623.15, three: 863.15, two: 1073.15, five: 2273.15 } as const;

/**
 * Pressures that bound the formulation, Pa: of regions 1, 2 and 3, and of region 5. It reaches down to zero; below 1 Pa,
 * where no relief system works, rounding would begin to show.
 */
export const LIMITS_P = { least: 1, most: 100e6, five: 50e6 } as const;
