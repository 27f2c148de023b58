/* Resistance of fittings in velocity heads, by the method that the engineer chooses. */
import { type Fitting, FITTINGS } from './fitting-data';

/** How a fitting's resistance is found: fixed K, equivalent length, two constants (Hooper) or three (Darby). */
export type FittingMethod = 'K' | 'length' | '2-K' | '3-K';

/** Methods in the order in which they are offered. */
export const FITTING_METHODS: readonly FittingMethod[] = ['K', 'length', '2-K', '3-K'];

/** Absolute roughness of commercial steel for the fully turbulent factor of equivalent lengths, m (Crane TP-410). */
const CLEAN_STEEL = 4.57e-5;
const INCH = 0.0254;

/** Where a fitting stands: inside bore m, Reynolds number, nominal bore in inches where known (3-K; the inside bore otherwise). */
export type FittingPlace = { D: number; Re: number; nominal?: number };

/** Darcy friction factor of complete turbulence in clean steel pipe, f_T = 0.25/lg²(ε/3.7 D). Source: Crane TP-410 (from memory). */
export function turbulentFactor(D: number): number {
  return 0.25 / Math.log10(CLEAN_STEEL / (3.7 * D)) ** 2;
}

/** Hooper's two constants: K = K1/Re + K∞ (1 + 1/D), D inside bore in inches. */
export function twoK(K1: number, Kinf: number, { D, Re }: FittingPlace): number {
  return K1 / Re + Kinf * (1 + INCH / D);
}

/** Darby's three constants: K = K1/Re + Ki (1 + Kd/Dn^0.3), Dn nominal bore in inches. */
export function threeK(K1: number, Ki: number, Kd: number, { D, Re, nominal }: FittingPlace): number {
  return K1 / Re + Ki * (1 + Kd / (nominal ?? D / INCH) ** 0.3);
}

/** Finds a fitting by key or by name. */
export function fittingNamed(word: string): Fitting | undefined {
  return FITTINGS.find((one) => one.key === word || one.name === word);
}

/**
 * Velocity heads of one fitting by a method; entrances and exits have a fixed K whatever the method.
 * @returns undefined when the method has no figure for this fitting
 */
export function fittingK(fitting: Fitting, method: FittingMethod, place: FittingPlace): number | undefined {
  if (fitting.K !== undefined) return fitting.K;
  if (method === 'length')
    return fitting.diameters === undefined ? undefined : fitting.diameters * turbulentFactor(place.D);
  if (method === '2-K') return fitting.twoK && twoK(fitting.twoK.K1, fitting.twoK.Kinf, place);
  if (method === '3-K')
    return fitting.threeK && threeK(fitting.threeK.K1, fitting.threeK.Ki, fitting.threeK.Kd, place);
  return undefined;
}
