/* Boiling of a liquid at constant pressure with the vapour leaving: what is left, and the heat each kilogram of vapour takes. */
import { type Boundary, fluidOf, type Substance } from '../../fluids';
import { at } from '../../fluids/cubic/vector';
import { type PhaseState } from '../../properties/types';
import { GAS_CONSTANT } from '../a-gas/flow';

/** A stretch of the boiling curve, from one fraction of the mass vaporised to the next. */
export type Stretch = {
  /** Fraction of the first mass that had left in the middle of the stretch. */
  fraction: number;
  /** Boiling temperature in the middle, K. */
  T: number;
  /** Heat that goes in for each kilogram of vapour that leaves, J/kg: warming of what stays included. */
  heat: number;
  /** Latent heat by itself, vapour less liquid at one temperature, J/kg. */
  latent: number;
  /** Molar mass and compressibility of the vapour. */
  M: number;
  Z: number;
  vapour: PhaseState;
  y: number[];
};

/** Why a curve ends before it should. */
export type Ended = { fraction: number };

type Contents = { substances: readonly Substance[]; moles: number[] };

const total = (a: readonly number[]) => a.reduce((sum, value) => sum + value, 0);

function massOf({ substances, moles }: Contents): number {
  return substances.reduce((sum, s, i) => sum + s.M[0] * at(moles, i), 0);
}

/** The first bubble of what is left. */
function bubble({ substances, moles }: Contents, P: number): Boundary | undefined {
  const n = total(moles);
  const kept = substances.flatMap((s, i) => (at(moles, i) > 1e-9 * n ? [{ s, z: at(moles, i) / n }] : []));
  const sum = total(kept.map((k) => k.z));
  const found = fluidOf({ substances: kept.map((k) => k.s), z: kept.map((k) => k.z / sum) }).boundary(
    P,
    'bubble',
  );
  if (found === undefined) return undefined;
  let next = 0;
  const y = substances.map((_, i) => (at(moles, i) > 1e-9 * n ? at(found.y, next++) : 0));
  return { ...found, y };
}

/** What is left after `mass` kg of a vapour of mole fractions `y` has gone. */
function without(contents: Contents, y: readonly number[], mass: number): Contents {
  const M = contents.substances.reduce((sum, s, i) => sum + s.M[0] * at(y, i), 0);
  const moles = contents.moles.map((n, i) => Math.max(0, n - (at(y, i) * mass) / M));
  return { substances: contents.substances, moles };
}

/**
 * The boiling curve of a kilogram at P (Pa), in `steps` equal stretches up to the fraction `last` (below 1). The vapour
 * leaves as it forms (Rayleigh); each stretch takes the vapour of its middle, and its heat from the enthalpies before and
 * after: m₂h₂ − m₁h₁ + Δm h(vapour). Ends early, with `ended`, where the rest has no bubble point within the data.
 */
export function boilingCurve(
  substances: readonly Substance[],
  z: readonly number[],
  P: number,
  steps: number,
  last: number,
): { stretches: Stretch[]; ended?: Ended } {
  const M = substances.reduce((sum, s, i) => sum + s.M[0] * at(z, i), 0);
  const size = last / steps;
  let now: Contents = { substances, moles: z.map((share) => share / M) };
  let before = bubble(now, P);
  const stretches: Stretch[] = [];
  for (let k = 0; k < steps; k += 1) {
    const end = { fraction: k * size };
    if (before === undefined) return { stretches, ended: end };
    const middle = bubble(without(now, before.y, size / 2), P);
    if (middle === undefined) return { stretches, ended: end };
    const next = without(now, middle.y, size);
    const after = bubble(next, P);
    if (after === undefined) return { stretches, ended: end };
    const { vapour, liquid } = middle;
    const heat = (massOf(next) * after.liquid.h - massOf(now) * before.liquid.h) / size + vapour.h;
    const vapourM = substances.reduce((sum, s, i) => sum + s.M[0] * at(middle.y, i), 0);
    stretches.push({
      fraction: (k + 0.5) * size,
      T: middle.T,
      heat,
      latent: vapour.h - liquid.h,
      M: vapourM,
      Z: (P * vapourM) / (vapour.rho * GAS_CONSTANT * middle.T),
      vapour,
      y: middle.y,
    });
    now = next;
    before = after;
  }
  return { stretches };
}
