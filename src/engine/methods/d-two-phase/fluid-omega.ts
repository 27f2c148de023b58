/* Omega and its mass flux for a fluid whose properties are known, in the forms that its inlet allows; coherent SI. */
import { bubbleAt, type Inlet } from '../../nozzle/inlet';
import { type PropertySource, type Saturation } from '../../properties/types';
import { omegaFlux, type OmegaFlow, subcooledFlux } from './omega';
import {
  type FlashInlet,
  omegaFromProperties,
  omegaFromVolumes,
  omegaSubcooledFromProperties,
} from './omega-forms';

/** An omega with the mass flux that it gives; of a subcooled inlet also its saturation pressure, Pa. */
export type OmegaResult = OmegaFlow & { omega: number; Ps?: number };

/** Inlet properties of the omega forms, from both saturated phases; x0 by mass, latent heat the difference of enthalpies. */
export function flashInlet(saturation: Saturation, P0: number, x0: number): FlashInlet {
  const { liquid, vapour } = saturation;
  return {
    x0,
    vVapour: 1 / vapour.rho,
    vLiquid: 1 / liquid.rho,
    cp: liquid.cp,
    T0: liquid.T,
    P0,
    latentHeat: vapour.h - liquid.h,
  };
}

/** The saturated liquid at the inlet temperature of a subcooled inlet. */
function saturated(source: PropertySource, inlet: Inlet) {
  return bubbleAt(source, inlet.state.T, inlet.state.P);
}

/**
 * Omega from two volumes of the isentrope and its flux: 90 % of the inlet pressure, or of the saturation pressure for a
 * subcooled inlet. Undefined where the fluid has no such states.
 */
export function omegaByVolumes(source: PropertySource, inlet: Inlet, Pb: number): OmegaResult | undefined {
  const { P, s, rho } = inlet.state;
  if (inlet.phase !== 'subcooled liquid') {
    const at9 = source.atPS(0.9 * P, s);
    const omega = at9 && omegaFromVolumes(1 / rho, 1 / at9.rho);
    return omega === undefined || omega < 0 ? undefined : { ...omegaFlux(omega, P, 1 / rho, Pb), omega };
  }
  const bubble = saturated(source, inlet);
  const at9 = bubble && source.atPS(0.9 * bubble.P, bubble.states.liquid.s);
  if (!bubble || !at9) return undefined;
  const omega = omegaFromVolumes(1 / rho, 1 / at9.rho);
  if (!(omega > 0)) return undefined;
  return { ...subcooledFlux({ P0: P, rho0: rho, Ps: bubble.P, omegaS: omega }, Pb), omega, Ps: bubble.P };
}

/** Omega from inlet properties and its flux; undefined for a vapour, and where omega would not be above nought. */
export function omegaByProperties(source: PropertySource, inlet: Inlet, Pb: number): OmegaResult | undefined {
  const { P, rho, x } = inlet.state;
  if (inlet.phase === 'subcooled liquid') {
    const bubble = saturated(source, inlet);
    const omega = bubble && omegaSubcooledFromProperties(flashInlet(bubble.states, bubble.P, 0));
    if (!bubble || omega === undefined || !(omega > 0)) return undefined;
    return { ...subcooledFlux({ P0: P, rho0: rho, Ps: bubble.P, omegaS: omega }, Pb), omega, Ps: bubble.P };
  }
  if (!inlet.saturation || x === undefined) return undefined;
  const omega = omegaFromProperties(flashInlet(inlet.saturation, P, x));
  return omega > 0 ? { ...omegaFlux(omega, P, 1 / rho, Pb), omega } : undefined;
}
