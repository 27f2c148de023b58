/* Sheets of the lines of a relief point: inlet loss, outlet under own relief and in the worst common cause, force and noise. */
import { type Path, quantityOf, type ReliefPoint } from '@domain/basis';
import { fromSI, type Q } from '@engine/quantity';
import { absoluteQ, type LineFluid } from './line-fluid';
import { compressibilityAt, enlargementOf, type OutletCase, outletMethod, viscosityAt } from './outlet-cases';
import { fillPipes, type Flow, lineOf, nth, type Pipe, pipesOf, areMeasured } from './piping';
import { ratedPressure } from './rated';
import { type Made, workedSheet } from './sheets';
import { type Sheet } from './types';
import { type Work } from './work';

/** The flow that a line is worked with: what it is, its value in a pipe (kg/s) and where it came from. */
export type LineFlow = { basis: 'rated' | 'required'; path: Path; in: (pipe: Pipe) => number };

/** Flows of the pipes as inputs, in the mass unit of the basis. */
function flowsOf(work: Work, pipes: readonly Pipe[], flow: LineFlow, mu: (index: number) => number): Flow[] {
  const unit = work.basis.units === 'US' ? 'lb/h' : 'kg/h';
  return pipes.map((pipe, index) => ({ W: fromSI(flow.in(pipe), unit), path: flow.path, mu: mu(index) }));
}

function put(made: Made, name: string, value: Q | string | undefined, path: Path): void {
  if (value === undefined) return;
  made.inputs[name] = typeof value === 'object' ? { value: value.value, unit: value.unit } : value;
  made.from[name] = path;
}

/** What every line sheet holds: set pressure, barometer, what the flow is. */
function common(work: Work, point: ReliefPoint, flow: LineFlow): Made {
  const made: Made = { inputs: {}, from: {} };
  put(made, 'set_pressure', quantityOf(point.set), `reliefPoints/${point.id}/set`);
  put(made, 'atmospheric_pressure', work.context.barometer, 'site/barometer');
  put(made, 'flow_basis', flow.basis, flow.path);
  return made;
}

function fluidInputs(made: Made, fluid: LineFluid, names: Readonly<Record<string, string>>): void {
  for (const [theirs, ours] of Object.entries(names)) {
    const found = fluid.inputs[theirs];
    if (found) put(made, ours, found.q, found.path);
  }
}

const INLET_NAMES = { T: 'T0', Z: 'Z', M: 'M', k: 'k', rho: 'rho', mu: 'mu' };
const OUTLET_NAMES: Record<string, Readonly<Record<string, string>>> = {
  'g.outlet-isothermal': { T: 'T', Z: 'Z', M: 'M', k: 'k', mu: 'mu' },
  'g.outlet-fanno': { T: 'T0', Z: 'Z', M: 'M', k: 'k', mu: 'mu' },
  'g.outlet-liquid': { rho: 'rho', mu: 'mu' },
  'g.outlet-homogeneous': { P0: 'P0', v0: 'v0', omega: 'omega', mu: 'mu' },
};

/** The inlet loss at the flow given, incompressible at the density ahead of the line; nothing without a measured inlet line. */
export function inletSheet(
  work: Work,
  point: ReliefPoint,
  fluid: LineFluid,
  flow: LineFlow,
): Sheet | undefined {
  const line = lineOf(work.basis, point, 'inlet');
  const pipes = pipesOf(work.basis, line);
  const set = quantityOf(point.set);
  if (!line || !pipes || !areMeasured(pipes) || fluid.kind === 'mixture') return undefined;
  const made = common(work, point, flow);
  fluidInputs(made, fluid, INLET_NAMES);
  if (fluid.kind === 'gas' && set)
    put(made, 'P1', absoluteQ(work, ratedPressure(work, set)), `reliefPoints/${point.id}/set`);
  const limit = work.rules.parameters['inletLoss'];
  if (typeof limit === 'number' && limit !== 0.03)
    put(made, 'loss_limit', { value: limit, unit: '-' }, 'rules/inletLoss');
  fillPipes(
    made,
    pipes,
    flowsOf(work, pipes, flow, () => fluid.mu),
  );
  return workedSheet(`inlet:${point.id}`, 'g.inlet-loss', undefined, made, `lines/${line.id}`);
}

/** Where a header follows the tail pipe: compressibility and viscosity of each pipe. */
function headerInputs(made: Made, one: OutletCase, fluid: LineFluid): void {
  const header = one.pipes[one.tail]?.at.split('/network')[0] ?? 'imports';
  one.pipes.forEach((_pipe, index) => {
    const own = index < one.tail;
    const mu = fromSI(viscosityAt(one, index, fluid.mu), 'cP');
    put(made, nth('mu', index), mu, own ? (fluid.inputs['mu']?.path ?? header) : `${header}/viscosity`);
    if (fluid.kind !== 'gas') return;
    const Z = { value: compressibilityAt(one, index, fluid.Z), unit: '-' };
    put(made, nth('Z', index), Z, own ? (fluid.inputs['Z']?.path ?? header) : 'method default');
  });
}

/** The outlet of one case as a sheet, `outlet:<point>/own` or `outlet:<point>/<common cause>`. */
export function outletSheet(
  work: Work,
  point: ReliefPoint,
  one: OutletCase,
  fluid: LineFluid,
  flow: LineFlow,
): Sheet {
  const method = outletMethod(one, fluid);
  const made = common(work, point, flow);
  fluidInputs(made, fluid, OUTLET_NAMES[method] ?? {});
  put(made, 'P_exit_ambient', absoluteQ(work, one.end.pa), one.end.path);
  if (method === 'g.outlet-fanno' && enlargementOf(one) === 'momentum')
    put(made, 'enlargement_model', 'momentum', `lines/${one.line.id}`);
  const mu = (index: number) => viscosityAt(one, index, fluid.mu);
  fillPipes(made, one.pipes, flowsOf(work, one.pipes, flow, mu));
  if (one.tail < one.pipes.length) headerInputs(made, one, fluid);
  return workedSheet(`outlet:${point.id}/${one.id}`, method, undefined, made, `lines/${one.line.id}`);
}

/** Thrust of a gas that leaves to the atmosphere, and its noise 30 m away; nothing for other ends and other fluids. */
export function dischargeSheets(
  work: Work,
  point: ReliefPoint,
  one: OutletCase,
  fluid: LineFluid,
  flow: LineFlow,
): Sheet[] {
  const last = one.pipes.at(-1);
  const set = quantityOf(point.set);
  if (!last || !set || fluid.kind !== 'gas' || one.line.end?.to !== 'atmosphere') return [];
  const W = fromSI(flow.in(last), work.basis.units === 'US' ? 'lb/h' : 'kg/h');
  const at = `lines/${one.line.id}`;
  const force: Made = { inputs: {}, from: {} };
  put(force, 'W', W, flow.path);
  put(force, 'D_outlet', quantityOf(last.segment.bore), `${last.at}/bore`);
  fluidInputs(force, fluid, { T: 'T0', Z: 'Z', M: 'M', k: 'k' });
  put(force, 'P_ambient', work.context.barometer, 'site/barometer');
  put(force, 'dynamic_load_factor', quantityOf(one.line.support?.dlf), `${at}/support/dlf`);
  const noise: Made = { inputs: {}, from: {} };
  put(noise, 'W', W, flow.path);
  put(noise, 'P1', absoluteQ(work, ratedPressure(work, set)), `reliefPoints/${point.id}/set`);
  put(noise, 'P2', work.context.barometer, 'site/barometer');
  fluidInputs(noise, fluid, { T: 'T', Z: 'Z', M: 'M', k: 'k' });
  return [
    workedSheet(`force:${point.id}`, 'g.reaction-force', undefined, force, at),
    workedSheet(`noise:${point.id}`, 'g.noise', undefined, noise, at),
  ];
}
