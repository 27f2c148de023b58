/* The same inlet by every method that can work it, and the bounds of all liquid and all vapour; coherent SI. */
import { hemThroat } from '../../nozzle/hem';
import { type Inlet } from '../../nozzle/inlet';
import { type PhaseState, type PropertySource } from '../../properties/types';
import { GAS_CONSTANT, nozzleFlux } from '../a-gas/flow';
import { flashInlet, omegaByProperties, omegaByVolumes } from './fluid-omega';
import { omegaFlux, omegaRatio } from './omega';
import { BOILING_DELAY, omegaDelayed, omegaNonFlashing } from './omega-forms';

/** The ways to a mass flux that are held against each other. */
export const WAYS = [
  'integration',
  'omega_volumes',
  'omega_properties',
  'delayed_boiling',
  'no_flashing',
  'ideal_gas',
  'all_vapour',
  'all_liquid',
] as const;

/** One way. */
export type Way = (typeof WAYS)[number];

/** Mass fluxes, kg/(m²·s), of the ways that the inlet allows. */
export type Fluxes = Partial<Record<Way, number>>;

/** The ideal formula on a gas at the inlet, with Z and real cp/cv. */
function idealGas(source: PropertySource, gas: PhaseState, Pb: number): number {
  const Z = (gas.P * source.M) / (gas.rho * GAS_CONSTANT * gas.T);
  return nozzleFlux({ P1: gas.P, P2: Pb, T: gas.T, Z, M: source.M, k: gas.cp / gas.cv }).flux;
}

/** Ways of an inlet at which liquid and vapour can stand together: delay of boiling, none at all, and both bounds. */
function saturatedWays(source: PropertySource, inlet: Inlet, Pb: number): Fluxes {
  const { saturation, state } = inlet;
  if (!saturation || inlet.phase === 'vapour' || inlet.phase === 'supercritical') return {};
  const { liquid, vapour } = saturation;
  const subcooled = inlet.phase === 'subcooled liquid';
  const density = subcooled ? state.rho : liquid.rho;
  const dry = hemThroat(source, { ...vapour, x: 1 }, Pb)?.flux;
  const bounds: Fluxes = {
    all_liquid: Math.sqrt(2 * density * (state.P - Pb)),
    ...(dry === undefined ? {} : { all_vapour: dry }),
  };
  if (subcooled || state.x === undefined) return bounds;
  const flash = flashInlet(saturation, state.P, state.x);
  const { omega } = omegaDelayed(flash, BOILING_DELAY['safety valve'], omegaRatio);
  const frozen = omegaNonFlashing(state.x, flash.vVapour, flash.vLiquid, vapour.cp / vapour.cv);
  const by = (w: number) => omegaFlux(w, state.P, 1 / state.rho, Pb).flux;
  return { ...bounds, delayed_boiling: by(omega), no_flashing: by(frozen) };
}

/** The gas at the inlet, where it is one. */
function gasOf(source: PropertySource, inlet: Inlet): PhaseState | undefined {
  if (inlet.phase === 'saturated vapour') return inlet.saturation?.vapour;
  const gas = inlet.phase === 'vapour' || inlet.phase === 'supercritical';
  return gas ? source.atPT(inlet.state.P, inlet.state.T) : undefined;
}

/** Mass fluxes of one inlet against Pb (Pa), by every way that can work it. */
export function compareFluxes(source: PropertySource, inlet: Inlet, Pb: number): Fluxes {
  const gas = gasOf(source, inlet);
  const known: [Way, number | undefined][] = [
    ['integration', hemThroat(source, inlet.state, Pb)?.flux],
    ['omega_volumes', omegaByVolumes(source, inlet, Pb)?.flux],
    ['omega_properties', omegaByProperties(source, inlet, Pb)?.flux],
    ['ideal_gas', gas && idealGas(source, gas, Pb)],
  ];
  const found = known.filter((one): one is [Way, number] => one[1] !== undefined && Number.isFinite(one[1]));
  return { ...Object.fromEntries(found), ...saturatedWays(source, inlet, Pb) };
}
