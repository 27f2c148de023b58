/* Coefficients of region 5, steam above 1073.15 K: ideal-gas part (Table 37) and residual part (Table 38) of IAPWS R7-97(2012). */
import { type Term } from './series';

/** Terms of γ° = ln π + Σ n τ^J; I is nought. */
export const REGION_5_IDEAL: readonly Term[] = [
  [0, 0, -13.179983674201],
  [0, 1, 6.8540841634434],
  [0, -3, -0.024805148933466],
  [0, -2, 0.36901534980333],
  [0, -1, -3.1161318213925],
  [0, 2, -0.32961626538917],
];

/** Terms of γʳ = Σ n π^I τ^J. */
export const REGION_5_RESIDUAL: readonly Term[] = [
  [1, 1, 0.0015736404855259],
  [1, 2, 0.00090153761673944],
  [1, 3, -0.0050270077677648],
  [2, 3, 2.2440037409485e-6],
  [2, 9, -4.1163275453471e-6],
  [3, 7, 3.7919454822955e-8],
];
