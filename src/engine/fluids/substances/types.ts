/* The form in which the data of one substance is kept: every datum with the key of its source. */
import { type SourceKey } from './sources';

/** A figure and where it comes from. */
export type Datum = readonly [value: number, source: SourceKey];

/** Coefficients of a correlation, the temperatures in K between which it holds, and where it comes from. */
export type Correlation = {
  a: readonly number[];
  range: readonly [low: number, high: number];
  source: SourceKey;
};

/**
 * One substance. Units: M kg/kmol; Tc, Tb K; Pc Pa; c (volume translation) m³/kmol.
 * `Tb` is missing where the substance sublimes at one atmosphere; `zra` where no liquid density was at hand.
 */
export type Substance = {
  name: string;
  aliases: readonly string[];
  formula: string;
  cas: string;
  M: Datum;
  Tc: Datum;
  Pc: Datum;
  /** Acentric factor; starts the search for equilibrium, the equation of state itself does not use it. */
  omega: Datum;
  /** Normal boiling point, for comparison: the equation must give one atmosphere there. */
  Tb?: Datum;
  /** Péneloux translation of the volume, constant: v = v(PR) − c. */
  c: Datum;
  /** Rackett factor of the saturated liquid's density (Spencer and Danner). */
  zra?: Datum;
  /** L, M, N of the Twu alpha function. */
  twu: readonly [lmn: readonly [L: number, M: number, N: number], source: SourceKey];
  /** Ideal-gas heat capacity: cp/R = Σ a_i (T/1000 K)^i. */
  cp: Correlation;
  /** Viscosity of the liquid, Pa·s: ln μ = a0 + a1/T + a2 ln T + a3 T^a4. */
  muL?: Correlation;
  /** Viscosity of the dilute vapour, Pa·s: μ = a0 T^a1 / (1 + a2/T + a3/T²). */
  muV?: Correlation;
};
