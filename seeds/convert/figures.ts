/* Figures of the invented site as figures of ours: origin kinds, units and copies from other documents. */
import { type F, type Input, type KnownFigure, type Origin, type Q, type Rich } from '@domain/basis';
import { type DemoInput, type DemoOrigin, type DemoQ } from './demo-types';
import { documentId, idOf } from './ids';

const ORIGIN_KINDS: Record<string, Origin['kind']> = {
  drawing: 'drawing',
  simulation: 'simulation',
  'data sheet': 'data-sheet',
  judgement: 'judgement',
  'test record': 'test-record',
  'field reading': 'field-reading',
  calculation: 'calculation',
};
const UNITS: Record<string, string> = { fraction: '-', 'fraction of gauge set pressure': '-', edition: '-' };

/** Relief points whose set pressure other systems copy, with the document that holds them. */
const COPIED: Record<string, string> = {
  'PSV-401A': 'SYS-401',
  'PSV-440A': 'SYS-404',
  'PSV-301A': 'SYS-301',
};
const COPY = /(PSV-\d+[A-Z])(?= set pressure)|(?<=set pressure of )(PSV-\d+[A-Z])/;
const STATED = /(\d+(?:\.\d+)?) bar_g$/;

/** The origin of a figure; one that names another system's set pressure becomes a copy of kind `figure`. */
export function originOf(origin: DemoOrigin, own?: Q): Origin {
  const tag = COPY.exec(origin.reference)?.[0];
  const system = tag === undefined ? undefined : COPIED[tag];
  if (tag === undefined || system === undefined || own === undefined) {
    return { kind: ORIGIN_KINDS[origin.kind] ?? 'judgement', ref: origin.reference };
  }
  const stated = STATED.exec(origin.reference)?.[1];
  const saturation = origin.reference.startsWith('Saturation');
  const taken = saturation && stated !== undefined ? { value: Number(stated), unit: 'bar_g' } : own;
  const path = `reliefPoints/${idOf('rp', tag)}/set`;
  const via = saturation ? ('saturation-temperature' as const) : ('same' as const);
  return { kind: 'figure', ref: origin.reference, figure: { doc: documentId(system), path, via, taken } };
}

/** A quantity without its origin, in a unit of ours. */
export function plainQ(q: DemoQ): Q {
  return { value: q.value, unit: UNITS[q.unit] ?? q.unit };
}

/** A figure; without an origin of its own it inherits that of its owner. */
export function figureOf(q: DemoQ): KnownFigure {
  const own = plainQ(q);
  return q.origin ? { ...own, origin: originOf(q.origin, own) } : own;
}

/** A figure, or nothing when the file has none. */
export function maybeFigure(q: DemoQ | undefined): F | undefined {
  return q === undefined ? undefined : figureOf(q);
}

/** Drops absent keys, so that a converted element holds only what is known. */
export function compact<T extends object>(fields: T): T {
  return Object.fromEntries(Object.entries(fields).filter(([, value]) => value !== undefined)) as T;
}

/** An input of a method: a figure, word, flag, or list of equipment ids. */
export function inputOf(input: DemoInput): Input {
  const origin = input.origin ? { origin: originOf(input.origin) } : {};
  if (typeof input.value === 'number') return figureOf({ ...input, value: input.value });
  if (typeof input.value === 'boolean') return { flag: input.value, ...origin };
  if (typeof input.value === 'string') return { word: input.value, ...origin };
  return { list: input.value.map((tag) => idOf('eq', tag)), ...origin };
}

/** A text of one paragraph. */
export function rich(text: string): Rich {
  return { type: 'doc', content: [{ type: 'paragraph', content: [{ type: 'text', text }] }] };
}
