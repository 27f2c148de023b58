/* The published ways to the omega parameter: two points of an isentrope, inlet properties, no flashing, delayed flashing. */

/** ω from the specific volumes at the inlet and at 90 % of the inlet pressure on the isentrope: 9 (v9/v0 − 1) (API 520-1 Annex C). */
export function omegaFromVolumes(v0: number, v9: number): number {
  return 9 * (v9 / v0 - 1);
}

/** Properties at the inlet: quality, specific volumes m³/kg, heat capacity of the liquid J/(kg·K), K, Pa, latent heat J/kg. */
export type FlashInlet = {
  x0: number;
  vVapour: number;
  vLiquid: number;
  cp: number;
  T0: number;
  P0: number;
  latentHeat: number;
};

/** Specific volume of the mixture: mass quality averages volumes, never densities. */
export function mixtureVolume(x0: number, vVapour: number, vLiquid: number): number {
  return x0 * vVapour + (1 - x0) * vLiquid;
}

/** (cp T0 P0 / v) ((v_v − v_l)/λ)²: what flashing adds to omega per unit of the volume v. */
function flashTerm(inlet: FlashInlet, v: number): number {
  const swell = (inlet.vVapour - inlet.vLiquid) / inlet.latentHeat;
  return ((inlet.cp * inlet.T0 * inlet.P0) / v) * swell * swell;
}

/**
 * ω of a flashing single component, or of a mixture that boils over a narrow range, from inlet properties:
 * (x0 v_v/v0)(1 − 2 P0 v_vl/λ) + (cp T0 P0/v0)(v_vl/λ)² (Leung 1995, API 520-1 Annex C; from memory).
 */
export function omegaFromProperties(inlet: FlashInlet): number {
  const v0 = mixtureVolume(inlet.x0, inlet.vVapour, inlet.vLiquid);
  const difference = inlet.vVapour - inlet.vLiquid;
  const vapour = ((inlet.x0 * inlet.vVapour) / v0) * (1 - (2 * inlet.P0 * difference) / inlet.latentHeat);
  return vapour + flashTerm(inlet, v0);
}

/** ω_s of a subcooled liquid from properties at its saturation pressure Ps at the inlet temperature (`P0` is Ps here): API 520-1 Annex C. */
export function omegaSubcooledFromProperties(inlet: Omit<FlashInlet, 'x0'>): number {
  return flashTerm({ ...inlet, x0: 0 }, inlet.vLiquid);
}

/** ω of gas with a liquid that does not flash, α0/k, by the inlet volume fraction of gas: Leung and Epstein 1990 (from memory). */
export function omegaNonFlashing(x0: number, vVapour: number, vLiquid: number, k: number): number {
  return (x0 * vVapour) / mixtureVolume(x0, vVapour, vLiquid) / k;
}

/** The exponent a of the delay of boiling: safety valves 2/5, orifices and short nozzles 3/5 (Diener and Schmidt 2004, ISO 4126-10; from memory). */
export const BOILING_DELAY = { 'safety valve': 0.4, 'short nozzle': 0.6 } as const;

/**
 * ω with the delay of boiling in a short nozzle: x0 v_v/v0 + N (cp T0 P0/v0)(v_vl/λ)²,
 * N = [x0 + cp T0 P0 (v_vl/λ²) ln(1/η_c)]^a at most 1, η_c the critical ratio with N = 1
 * (Diener and Schmidt 2004, ISO 4126-10; from memory). `ratioOf` gives η_c of an omega.
 */
export function omegaDelayed(
  inlet: FlashInlet,
  a: number,
  ratioOf: (omega: number) => number,
): { omega: number; N: number } {
  const v0 = mixtureVolume(inlet.x0, inlet.vVapour, inlet.vLiquid);
  const vapour = (inlet.x0 * inlet.vVapour) / v0;
  const flash = flashTerm(inlet, v0);
  const difference = inlet.vVapour - inlet.vLiquid;
  const formed =
    ((inlet.cp * inlet.T0 * inlet.P0 * difference) / inlet.latentHeat ** 2) *
    -Math.log(ratioOf(vapour + flash));
  const N = Math.min(1, (inlet.x0 + formed) ** a);
  return { omega: vapour + flash * N, N };
}
