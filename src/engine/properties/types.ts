/* What the engine asks of a fluid whose properties are worked: states in coherent SI, by pairs of known variables. */

/**
 * A state in coherent SI: Pa absolute, K, kg/m³, J/kg, J/(kg·K). `x` is the vapour mass fraction where liquid and vapour
 * stand together (0 at the bubble point, 1 at the dew point); undefined in one phase.
 */
export type FluidState = { P: number; T: number; rho: number; h: number; s: number; x?: number };

/** A single-phase state with what a nozzle, a line or a relief load asks of it; cp, cv J/(kg·K), w m/s, mu Pa·s. */
export type PhaseState = FluidState & { cp: number; cv: number; w: number; mu?: number };

/** The bubble and dew states at one pressure; of a pure substance they share the temperature. */
export type Saturation = { liquid: PhaseState; vapour: PhaseState };

/**
 * A fluid by its properties. Every function answers undefined outside the range in which the formulation holds or where it
 * does not converge: a method refuses then, and never sees NaN. `source` names formulation and data, for the sheet.
 */
export type PropertySource = {
  name: string;
  source: string;
  /** kg/kmol. */
  M: number;
  /** Critical point, Pa and K (pseudo-critical for a mixture, where `pure` is false). */
  critical: { P: number; T: number };
  pure: boolean;
  /** One phase at P and T; exactly at saturation the vapour. */
  atPT(P: number, T: number): PhaseState | undefined;
  /** Any state at P and vapour fraction 0…1. */
  atPx(P: number, x: number): FluidState | undefined;
  atPH(P: number, h: number): FluidState | undefined;
  atPS(P: number, s: number): FluidState | undefined;
  saturation(P: number): Saturation | undefined;
};
