/* The ways in which the outlet of a relief point can stand under pressure: its own relief to the very end, and the worst common cause. */
import { type Line, type Path, quantityOf, type ReliefPoint } from '@domain/basis';
import {
  adiabaticLine,
  type Enlargement,
  isothermalLine,
  liquidLine,
  marchedLine,
  omegaCurve,
} from '@engine/lines';
import { convert } from '@engine/quantity';
import { type LineFluid } from './line-fluid';
import { areMeasured, bareSegment, lineOf, type Pipe, pipesOf } from './piping';
import { type Work } from './work';

export type OutletMethod =
  'g.outlet-isothermal' | 'g.outlet-fanno' | 'g.outlet-liquid' | 'g.outlet-homogeneous';

/** One case: `own` or the id of a common cause; the first `tail` pipes are the point's own line, the others the header's. */
export type OutletCase = {
  id: string;
  line: Line;
  pipes: Pipe[];
  tail: number;
  end: { pa: number; path: Path };
  /** Viscosity in the header where its document states one, Pa·s. */
  headerMu?: number;
};

/** Flows of the pipes of a case, kg/s, in their order. */
export type Flows = (pipe: Pipe, index: number) => number;

type Place = { work: Work; point: ReliefPoint; line: Line; pipes: Pipe[] };

function pa(work: Work, figure: Parameters<typeof quantityOf>[0]): number | undefined {
  const q = quantityOf(figure);
  return q && convert(q, 'Pa_abs', work.context);
}

/** What stands beyond the end of a line without a header's own network: its end, else the superimposed pressure, else the air. */
function plainEnd({ work, point, line }: Place): OutletCase['end'] {
  const end = pa(work, line.end?.pressureMax) ?? pa(work, line.end?.pressure);
  if (end !== undefined) return { pa: end, path: `lines/${line.id}/end` };
  const stated = pa(work, point.superimposed?.max) ?? pa(work, point.superimposed?.min);
  if (stated !== undefined) return { pa: stated, path: `reliefPoints/${point.id}/superimposed` };
  return { pa: convert(work.context.barometer, 'Pa_abs'), path: 'site/barometer' };
}

function headerCases(place: Place, header: string): OutletCase[] {
  const { work, line, pipes } = place;
  const imported = work.imports.headers[header];
  if (!imported) return [{ id: 'own', line, pipes, tail: pipes.length, end: plainEnd(place) }];
  const path = `imports/${header}`;
  const network = imported.network.map((segment) => ({ segment, at: `${path}/network/${segment.id}` }));
  const own: OutletCase = {
    id: 'own',
    line,
    pipes: [...pipes, ...network],
    tail: pipes.length,
    end: { pa: convert(work.context.barometer, 'Pa_abs'), path: 'site/barometer' },
    ...(imported.viscosity ? { headerMu: convert(imported.viscosity, 'Pa.s') } : {}),
  };
  const worst = Object.entries(imported.causes)
    .map(([id, cause]) => ({ id, at: convert(cause.at, 'Pa_abs', work.context) }))
    .toSorted((a, b) => b.at - a.at)[0];
  if (!worst) return [own];
  const end = { pa: worst.at, path: `${path}/causes/${worst.id}/at` };
  return [own, { id: worst.id, line, pipes, tail: pipes.length, end }];
}

/** The cases of a relief point's outlet; none while it has no line or a bore or length is not known. */
export function outletCases(work: Work, point: ReliefPoint): OutletCase[] {
  const line = lineOf(work.basis, point, 'outlet');
  const pipes = pipesOf(work.basis, line);
  if (!line || !pipes) return [];
  const place = { work, point, line, pipes };
  const header = line.end?.to === 'header' ? line.end.header : undefined;
  const cases =
    header === undefined
      ? [{ id: 'own', line, pipes, tail: pipes.length, end: plainEnd(place) }]
      : headerCases(place, header);
  return cases.filter((one) => areMeasured(one.pipes));
}

/** Isothermal to a header, adiabatic to anything else; liquids and mixtures by their own methods. */
export function outletMethod(one: OutletCase, fluid: LineFluid): OutletMethod {
  if (fluid.kind === 'liquid') return 'g.outlet-liquid';
  if (fluid.kind === 'mixture') return 'g.outlet-homogeneous';
  const to = one.line.end?.to;
  return to === 'header' || to === 'inflow' ? 'g.outlet-isothermal' : 'g.outlet-fanno';
}

/** How the enlargements of a case are taken: by momentum only where every pipe ahead of one says so. */
export function enlargementOf(one: OutletCase): Enlargement {
  const ahead = one.pipes.slice(0, -1);
  const momentum = ahead.length > 0 && ahead.every(({ segment }) => segment.enlarges === 'momentum');
  return momentum ? 'momentum' : 'static';
}

/** Compressibility in the pipe: that of the gas in the tail pipe, 1 in the header, which stands near the atmosphere. */
export function compressibilityAt(one: OutletCase, index: number, Z: number): number {
  return index < one.tail ? Z : 1;
}

/** Viscosity in the pipe, Pa·s. */
export function viscosityAt(one: OutletCase, index: number, mu: number): number {
  return index < one.tail ? mu : (one.headerMu ?? mu);
}

/** Pressure at the outlet of the device, Pa absolute, when the pipes carry these flows; nothing where no pressure is found. */
export function pressureAt(one: OutletCase, fluid: LineFluid, flows: Flows): number | undefined {
  const segments = one.pipes.flatMap((pipe, index) => {
    const bare = bareSegment(pipe, flows(pipe, index), viscosityAt(one, index, fluid.mu));
    if (!bare) return [];
    return [fluid.kind === 'gas' ? { ...bare, Z: compressibilityAt(one, index, fluid.Z) } : bare];
  });
  if (segments.some(({ W }) => !(W > 0))) return one.end.pa;
  const method = outletMethod(one, fluid);
  if (fluid.kind === 'gas')
    return method === 'g.outlet-isothermal'
      ? isothermalLine(segments, fluid, one.end.pa)[0]?.inlet
      : adiabaticLine(segments, fluid, one.end.pa, enlargementOf(one))[0]?.inlet;
  if (fluid.kind === 'mixture')
    return marchedLine(segments, omegaCurve(fluid.P0, fluid.v0, fluid.omega), one.end.pa)?.[0]?.inlet;
  return liquidLine(segments, fluid.rho, one.end.pa)[0];
}
