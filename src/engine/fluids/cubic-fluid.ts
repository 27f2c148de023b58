/* What a fluid of the cubic equation tells beyond a source of properties: its phases with their compositions. */
import { type FluidState, type PhaseState, type PropertySource } from '../properties/types';
import { type Mixture } from './cubic/mixture';
import { type End } from './flash/saturation';

/** What stands at P and T; with two phases, both with their mole fractions, and the kmol of vapour per kmol of feed. */
export type Equilibrium = { state: FluidState; two?: TwoPhases };

/** Liquid and vapour in equilibrium. */
export type TwoPhases = {
  liquid: PhaseState;
  vapour: PhaseState;
  x: number[];
  y: number[];
  vapourMoles: number;
  /** Both phases are as dense as liquids: two liquids, of which a sheet for vapour and liquid must not speak as boiling. */
  twoLiquids: boolean;
};

/** The first bubble or the last drop at a pressure: the feed in one phase and what stands beside it in the other. */
export type Boundary = { T: number; liquid: PhaseState; vapour: PhaseState; x: number[]; y: number[] };

/** A fluid by the cubic equation. `range` holds the temperatures, K, between which it answers. */
export type CubicFluid = PropertySource & {
  mixture: Mixture;
  range: { low: number; high: number };
  equilibrium(P: number, T: number): Equilibrium | undefined;
  boundary(P: number, end: End): Boundary | undefined;
};
