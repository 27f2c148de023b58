/* Sources of a system: machines and valves among its equipment, and the bounds that the supplement names. */
import { type Source } from '@domain/basis';
import supplement from '../data/supplement/scenarios.json';
import { type DemoEquipment, type DemoQ, type DemoSystem } from './demo-types';
import { feedSources } from './feeds';
import { compact, figureOf, maybeFigure, originOf } from './figures';
import { idOf } from './ids';

type Bound = {
  tag: string;
  kind: string;
  name: string;
  pressure: DemoQ;
  limits: string;
  side: string | null;
};
const SOURCES: Record<string, Bound[] | undefined> = supplement.sources as never;

/** The id of a source inside its document. */
export const sourceId = (tag: string): string => idOf('src', tag);

function pumpOf(equipment: DemoEquipment): Source['pump'] {
  const positive =
    equipment.type !== undefined || equipment.tag.startsWith('P-301') || equipment.kind === 'compressor';
  return compact({
    displacement: positive ? ('positive' as const) : ('centrifugal' as const),
    type: equipment.type,
    rated: maybeFigure(equipment.rated_flow),
    speed: maybeFigure(equipment.speed),
    stages: equipment.stages,
  });
}

function valveOf(trim: NonNullable<DemoEquipment['trim']>): Source['valve'] {
  return {
    coefficient: figureOf(trim.coefficient),
    xT: figureOf(trim.xT),
    fL: figureOf(trim.FL),
    failsTo: 'shut',
    stop: { note: `Travel stop: ${trim.travel_stop}` },
  };
}

function machineOf(equipment: DemoEquipment): Source | undefined {
  const base = {
    id: sourceId(equipment.tag),
    tag: equipment.tag,
    equipment: idOf('eq', equipment.tag),
    origin: originOf(equipment.origin),
  };
  if (equipment.trim) return { ...base, kind: 'control-valve', valve: valveOf(equipment.trim) };
  if (equipment.kind === 'pump') return { ...base, kind: 'pump', pump: pumpOf(equipment) };
  return equipment.kind === 'compressor'
    ? { ...base, kind: 'compressor', pump: pumpOf(equipment) }
    : undefined;
}

/** All sources of a system; a bound on a machine or feed that is there already is written onto it. */
export function sourcesOf(system: DemoSystem): Source[] {
  const feeds = feedSources(system);
  const machines = system.equipment
    .flatMap((equipment) => machineOf(equipment) ?? [])
    .filter((machine) => !feeds.some((feed) => feed.tag === machine.tag));
  const bounds = SOURCES[system.id] ?? [];
  const written = [...machines, ...feeds].map((source) => {
    const own = bounds.find((bound) => bound.tag === source.tag);
    return own ? { ...source, name: source.name ?? own.name, pressure: figureOf(own.pressure) } : source;
  });
  const others = bounds.filter((bound) => !written.some((source) => source.tag === bound.tag));
  return [
    ...written,
    ...others.map((bound) => ({
      id: sourceId(bound.tag),
      tag: bound.tag,
      name: bound.name,
      kind: bound.kind as Source['kind'],
      pressure: figureOf(bound.pressure),
      ...(bound.kind === 'pump' ? { pump: { displacement: 'centrifugal' as const } } : {}),
    })),
  ];
}

/** The bound of a system's source: its figure and the rating that it stays below. */
export function boundOf(system: DemoSystem, tag: string): Bound | undefined {
  return (SOURCES[system.id] ?? []).find((bound) => bound.tag === tag);
}
