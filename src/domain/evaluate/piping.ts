/* The pipes of a line: the segments it runs through, as numbers for the arithmetic and as inputs with their paths for a sheet. */
import {
  type Basis,
  type F,
  type Line,
  type Path,
  quantityOf,
  type ReliefPoint,
  type Segment,
} from '@domain/basis';
import { fittingK, fittingNamed, frictionFactor, velocityHeads } from '@engine/lines';
import { fromSI, type Q, toSI } from '@engine/quantity';
import { type Made } from './sheets';

/** A segment of a line or of a header, with the path under which it stands. */
export type Pipe = { segment: Segment; at: Path };

/** A pipe in SI numbers. */
type Measured = { D: number; L: number; roughness: number; rise: number };

/** Clean commercial steel, m (textbook; Crane TP-410), where no roughness is stated. */
const STEEL: Q = { value: 0.046, unit: 'mm' };

/** The line of one side of a relief point. */
export function lineOf(basis: Basis, point: ReliefPoint, side: Line['side']): Line | undefined {
  return basis.lines.find((line) => line.point === point.id && line.side === side);
}

/** The pipes that a line runs through, from the equipment or device on; nothing when one of them is gone. */
export function pipesOf(basis: Basis, line: Line | undefined): Pipe[] | undefined {
  if (!line || line.path.length === 0) return undefined;
  const pipes = line.path.flatMap((id) => {
    const segment = basis.segments.find((one) => one.id === id);
    return segment ? [{ segment, at: `segments/${id}` }] : [];
  });
  return pipes.length === line.path.length ? pipes : undefined;
}

const si = (figure: F | undefined): number | undefined => {
  const q = quantityOf(figure);
  return q && toSI(q);
};

/** The pipe in numbers, or nothing while its bore or length is not known. */
function measured({ segment }: Pipe): Measured | undefined {
  const [D, L] = [si(segment.bore), si(segment.length)];
  if (D === undefined || L === undefined || !(D > 0) || !(L >= 0)) return undefined;
  return { D, L, roughness: si(segment.roughness) ?? toSI(STEEL), rise: si(segment.rise) ?? 0 };
}

/** Whether bores and lengths of all pipes are known. */
export function areMeasured(pipes: readonly Pipe[]): boolean {
  return pipes.every((pipe) => measured(pipe) !== undefined);
}

/**
 * Resistance of the fittings: velocity heads, and diameters of equivalent length. A fitting by 2-K or 3-K takes the published
 * constants of its name where the library has them, else the coefficient that is stated.
 */
function fittingsOf({ segment }: Pipe, D: number, Re: number): { K: number; diameters: number } {
  const sum = { K: 0, diameters: 0 };
  for (const { name, count, k, by } of segment.fittings) {
    const stated = quantityOf(k)?.value ?? 0;
    if (by === 'length') sum.diameters += count * stated;
    else if (by === '2-K' || by === '3-K') {
      const known = fittingNamed(name);
      sum.K += count * ((known && fittingK(known, by, { D, Re })) ?? stated);
    } else sum.K += count * stated;
  }
  return sum;
}

/** A pipe as the bare line functions take it, at a mass flow (kg/s) and viscosity (Pa·s); nothing while it is not measured. */
export function bareSegment(
  pipe: Pipe,
  W: number,
  mu: number,
): { D: number; N: number; W: number; rise: number } | undefined {
  const known = measured(pipe);
  if (!known) return undefined;
  const Re = (4 * W) / (Math.PI * known.D * mu);
  const { K, diameters } = fittingsOf(pipe, known.D, Re);
  const f = frictionFactor(Re, known.roughness / known.D);
  const N = velocityHeads(f, known.L + diameters * known.D, known.D, K);
  return { D: known.D, N, W, rise: known.rise };
}

/** What a sheet says of one pipe: its name in the list, its flow with the path, its viscosity where it differs. */
export type Flow = { W: Q; path: Path; mu: number };

/** The name of an input for the n-th pipe: bare for the first, with _2, _3 … after it. */
export function nth(name: string, index: number): string {
  return index === 0 ? name : `${name}_${String(index + 1)}`;
}

/** Adds the pipes to the inputs of a sheet, each figure as it was entered, with the path it stands at. */
export function fillPipes(made: Made, pipes: readonly Pipe[], flows: readonly Flow[]): void {
  pipes.forEach((pipe, index) => {
    const known = measured(pipe);
    const flow = flows[index];
    if (!known || !flow) return;
    const { segment, at } = pipe;
    const Re = (4 * toSI(flow.W)) / (Math.PI * known.D * flow.mu);
    const { K, diameters } = fittingsOf(pipe, known.D, Re);
    const length = quantityOf(segment.length);
    const put = (name: string, value: Q | undefined, path: Path) => {
      if (!value) return;
      made.inputs[nth(name, index)] = { value: value.value, unit: value.unit };
      made.from[nth(name, index)] = path;
    };
    put('W', flow.W, flow.path);
    put('D', quantityOf(segment.bore), `${at}/bore`);
    put('L', diameters === 0 ? length : fromSI(known.L + diameters * known.D, 'm'), `${at}/length`);
    put('roughness', quantityOf(segment.roughness) ?? STEEL, `${at}/roughness`);
    put('sum_K', { value: K, unit: '-' }, `${at}/fittings`);
    if (known.rise !== 0) put('rise', quantityOf(segment.rise), `${at}/rise`);
  });
}
