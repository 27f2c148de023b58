/* Rated capacity of a relief point: certified coefficient and actual area, at 10 % overpressure or its floor, in the governing fluid. */
import { type Path, quantityOf, type ReliefPoint } from '@domain/basis';
import { workMethod } from '@engine/catalog';
import { fromSI, type Q, toSI } from '@engine/quantity';
import { fluidOf, fluidValues } from './implicit';
import { actualArea } from './installed';
import { absoluteQ } from './line-fluid';
import { type Made, workedSheet } from './sheets';
import { type Sheet } from './types';
import { type CredibleAnswer, type Work } from './work';

/** A rating ready to be worked at any back pressure. */
export type Rating = { method: string; made: Made; at: Path };

const PROPERTIES: Record<string, readonly string[]> = {
  'a.rated-capacity': ['T', 'Z', 'M', 'k'],
  'b.rated-capacity': [],
  'c.rated-capacity': ['rho', 'mu'],
};
/** Properties without which the method works all the same. */
const LEFT_OUT = new Set(['mu']);

/** The method by what the governing answer is sized with: steam by Napier, liquids by the orifice, gases by the nozzle. */
function methodOf(work: Work, ca: CredibleAnswer): string | undefined {
  const { size } = ca.answer;
  if (size.by === 'method' && size.method === 'b.steam') return 'b.rated-capacity';
  const phase = fluidOf(work, ca)?.phase;
  if (phase === 'gas' || phase === 'vapour') return 'a.rated-capacity';
  return phase === 'liquid' ? 'c.rated-capacity' : undefined;
}

/** Relieving pressure of a rating, Pa absolute: set + 10 %, or set + the floor of the basis's units. */
export function ratedPressure(work: Work, set: Q): number {
  const floor = work.basis.units === 'US' ? toSI({ value: 3, unit: 'psi' }) : 20e3;
  return toSI(set) + Math.max(0.1 * toSI(set), floor) + toSI(work.context.barometer);
}

/** What is known of the device itself, as inputs. */
function deviceInputs(work: Work, point: ReliefPoint, method: string): Made | undefined {
  const at = `reliefPoints/${point.id}`;
  const liquid = method === 'c.rated-capacity';
  const set = quantityOf(point.set);
  const coefficient = quantityOf(liquid ? point.k?.liquid : point.k?.gas);
  const area = actualArea(point);
  if (!set || !coefficient || area === undefined || point.axes.direction === 'under') return undefined;
  const made: Made = {
    inputs: {
      A_actual: fromSI(area, work.basis.units === 'US' ? 'in2' : 'mm2'),
      K_certified: { value: coefficient.value, unit: coefficient.unit },
      P1: absoluteQ(work, ratedPressure(work, set)),
    },
    from: {
      A_actual: `${at}/orifice/actual`,
      K_certified: `${at}/k/${liquid ? 'liquid' : 'gas'}`,
      P1: `${at}/set`,
    },
  };
  const Kc = quantityOf(point.k?.kc);
  if (Kc) {
    made.inputs['Kc'] = { value: Kc.value, unit: Kc.unit };
    made.from['Kc'] = `${at}/k/kc`;
  }
  return made;
}

/** The rating of a relief point in the fluid of its governing answer; nothing while a figure is not known. */
export function ratingOf(work: Work, point: ReliefPoint, ca: CredibleAnswer | undefined): Rating | undefined {
  const method = ca && methodOf(work, ca);
  const made = method && deviceInputs(work, point, method);
  if (!ca || !method || !made) return undefined;
  const values = fluidValues(work, fluidOf(work, ca));
  for (const name of PROPERTIES[method] ?? []) {
    const found = values[name]?.();
    if (!found && !LEFT_OUT.has(name)) return undefined;
    if (!found) continue;
    made.inputs[name] = found.value;
    made.from[name] = found.path;
  }
  const { size } = ca.answer;
  if (method === 'c.rated-capacity' && size.by === 'method' && /\b[789](E|th)/.test(size.edition ?? '')) {
    made.inputs['Kv_formula'] = '7E-9E';
    made.from['Kv_formula'] = 'method default';
  }
  return { method, made, at: `reliefPoints/${point.id}` };
}

function withBack(work: Work, rating: Rating, back: { pa: number; path: Path }): Made {
  if (rating.method === 'b.rated-capacity') return rating.made;
  return {
    inputs: { ...rating.made.inputs, P2: absoluteQ(work, back.pa) },
    from: { ...rating.made.from, P2: back.path },
  };
}

/** Rated mass flow against a back pressure, kg/s; 0 when the method refuses. */
export function ratedFlow(work: Work, rating: Rating, back: { pa: number; path: Path }): number {
  const worked = workMethod(rating.method, withBack(work, rating, back).inputs);
  const W = worked.refused ? undefined : worked.outputs['W_rated'];
  return typeof W === 'object' ? toSI(W) : 0;
}

/** The rated-capacity sheet against a back pressure. */
export function ratedSheet(
  work: Work,
  point: ReliefPoint,
  rating: Rating,
  back: { pa: number; path: Path },
): Sheet {
  return workedSheet(`rated:${point.id}`, rating.method, undefined, withBack(work, rating, back), rating.at);
}
