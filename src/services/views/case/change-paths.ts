/* Which figures and words of a relief basis are offered for change, element by element, in reading order. */
import {
  type Answer,
  type Basis,
  type Calc,
  type Equipment,
  type ExternalSheet,
  type Fluid,
  getAt,
  type Path,
  type ReliefPoint,
  type Source,
} from '@domain/basis';
import { methodById } from '@engine/catalog';

/** Paths below an element: those always offered, and those offered where something stands. */
export type Offered = { always: Path[]; present: Path[] };

function under(parent: string, names: readonly string[]): Path[] {
  return names.map((name) => `${parent}/${name}`);
}

export function offeredOfEquipment(item: Equipment): Offered {
  const at = `equipment/${item.id}`;
  const sides = item.sides.map((side) => `${at}/sides/${side.id}`);
  const ratings = item.sides.flatMap((side) =>
    side.ratings.flatMap((one) => under(`${at}/sides/${side.id}/ratings/${one.id}`, ['mawp', 'at'])),
  );
  const operating = sides.flatMap((side) => under(`${side}/operating`, ['normal', 'max', 'temperature']));
  return {
    always: [...ratings, ...operating],
    present: [
      ...sides.flatMap((side) => under(side, ['mdmt', 'designVacuum', 'external', 'test'])),
      ...under(at, ['levels/normal', 'levels/high', 'levels/fire', 'elevation']),
      ...under(at, ['shape/diameter', 'shape/length', 'insulation/thickness', 'insulation/conductivity']),
      ...under(at, ['volume', 'inventory']),
    ],
  };
}

const SOURCE_FIELDS = {
  pump: ['shutoff', 'suctionMax', 'rated', 'impeller', 'speed', 'coefficient'],
  valve: ['coefficient', 'xT', 'fL', 'upstreamMax', 'stop/kv', 'failsTo'],
  orifice: ['bore', 'cd'],
  heat: ['ua', 'duty', 'hot', 'removed'],
  check: ['nominal', 'leak'],
} as const;

export function offeredOfSource(source: Source): Offered {
  const at = `sources/${source.id}`;
  const parts = Object.entries(SOURCE_FIELDS).filter(([part]) => part in source);
  const curve = (source.pump?.curve ?? []).flatMap((one) => under(`${at}/pump/curve/${one.id}`, ['q', 'dp']));
  const general = under(at, ['pressure', 'temperature', 'flow']);
  return {
    always: parts.length === 0 ? general : [],
    present: [
      ...parts.flatMap(([part, names]) => under(`${at}/${part}`, names)),
      ...curve,
      ...(parts.length === 0 ? [] : general),
    ],
  };
}

export function offeredOfFluid(fluid: Fluid): Offered {
  const at = `fluids/${fluid.id}`;
  const liquid = fluid.phase === 'liquid' || fluid.phase === 'flashing-liquid';
  const always = liquid ? ['T', 'rhoLiquid', 'muLiquid'] : ['T', 'M', 'Z', 'k', 'latentHeat'];
  const rest = ['phase', 'P', 'T', 'M', 'Z', 'k', 'n', 'latentHeat', 'cpLiquid', 'rhoVapour', 'rhoLiquid'];
  const more = ['relativeDensity', 'muVapour', 'muLiquid', 'expansion', 'quality', 'omega', 'v0', 'v9'];
  return {
    always: under(at, always),
    present: under(
      at,
      [...rest, ...more].filter((name) => !always.includes(name)),
    ),
  };
}

const POINT_ALWAYS = [
  'set',
  'orifice/letter',
  'orifice/effective',
  'orifice/actual',
  'overpressure',
  'blowdown',
  'cdtp',
  'maker',
  'model',
];
const POINT_PRESENT = [
  ...['setVacuum', 'fullFlow', 'fullFlowVacuum', 'temperatureFactor', 'orifice/vacuum', 'k/gas', 'k/liquid'],
  ...['k/kb', 'k/kw', 'k/kc', 'capacity/of', 'limits/back', 'superimposed/min', 'superimposed/max'],
  ...['axes/balance', 'duty', 'service', 'seat', 'inlet/nominal', 'outlet/nominal'],
  ...['disk/burst', 'disk/netArea', 'disk/kr', 'spring/lo', 'spring/hi', 'test/interval'],
];

export function offeredOfPoint(point: ReliefPoint): Offered {
  const at = `reliefPoints/${point.id}`;
  return { always: under(at, POINT_ALWAYS), present: under(at, POINT_PRESENT) };
}

function inputsOf(at: Path, calc: Calc): Offered {
  if (calc.by === 'given') return { always: [`${at}/figure`], present: [] };
  if (calc.by !== 'method') return { always: [], present: [] };
  const method = methodById(calc.method);
  const required = (method?.inputs ?? []).filter((input) => input.required).map((input) => input.name);
  const optional = (method?.inputs ?? []).filter((input) => !input.required).map((input) => input.name);
  const entered = Object.keys(calc.inputs);
  const names = [...new Set([...entered, ...required])];
  return {
    always: under(`${at}/inputs`, names),
    present: under(
      `${at}/inputs`,
      optional.filter((name) => !names.includes(name)),
    ),
  };
}

/** The inputs of an answer: what its load and its size are worked from. */
export function offeredOfAnswer(scenario: string, answer: Answer): Offered {
  const at = `scenarios/${scenario}/answers/${answer.id}`;
  const load = inputsOf(`${at}/load`, answer.load);
  const size = inputsOf(`${at}/size`, answer.size);
  return { always: [...load.always, ...size.always], present: [`${at}/T`, `${at}/lowest`] };
}

export function offeredOfExternal(sheet: ExternalSheet): Offered {
  const at = `externalSheets/${sheet.id}`;
  return {
    always: under(`${at}/figures`, Object.keys(sheet.figures)),
    present: under(`${at}/inputs`, Object.keys(sheet.inputs)),
  };
}

/** The paths shown of an element: all that are always offered, the others where the document or its base has something. */
export function shownPaths(offered: Offered, document: Basis, base: Basis | undefined): Path[] {
  const there = (path: Path) =>
    getAt(document, path) !== undefined || (base !== undefined && getAt(base, path) !== undefined);
  return [...offered.always, ...offered.present.filter(there)];
}
