/* Inlet and outlet lines of the invented site; segments that carry the group's flow become one shared segment. */
import { type Line, type Segment } from '@domain/basis';
import { type DemoLine, type DemoSegment, type DemoSystem } from './demo-types';
import { compact, figureOf, maybeFigure, rich } from './figures';
import { documentId, idOf, personId, slug, uniqueIds } from './ids';
import { pointId } from './points';

/** Lines and the segments that they run through. */
export type Piping = { lines: Line[]; segments: Segment[] };

/** One segment with its fittings; fittings take their origin from the drawing of the line. */
export function segmentOf(segment: DemoSegment, id: string, drawing: string): Segment {
  const unique = uniqueIds();
  return {
    id,
    nominal: segment.nominal,
    bore: figureOf(segment.inside_diameter),
    length: figureOf(segment.length),
    roughness: figureOf(segment.roughness),
    enlarges: 'static',
    fittings: segment.fittings.map((fitting) => ({
      id: unique(idOf('ft', fitting.name).slice(0, 60)),
      name: fitting.name,
      count: fitting.count,
      k: { value: fitting.K, unit: '-', origin: { kind: 'drawing' as const, ref: drawing } },
      by: 'K' as const,
    })),
  };
}

const ENDS: Record<string, NonNullable<Line['end']>['to']> = {
  header: 'header',
  process: 'process',
  atmosphere: 'atmosphere',
  sewer: 'sewer',
  'catch tank': 'catch-tank',
};

function nearOf(place: string | undefined): NonNullable<Line['end']>['near'] {
  if (place === undefined) return undefined;
  const below = /(\d+(?:\.\d+)?) m below/.exec(place)?.[1];
  const away = /(\d+(?:\.\d+)?) m (?:aside|away)/.exec(place)?.[1] ?? /, (\d+(?:\.\d+)?) m$/.exec(place)?.[1];
  const metres = (text: string | undefined) =>
    text === undefined ? undefined : { value: Number(text), unit: 'm' };
  return [compact({ id: 'nr_1', place, dx: metres(away), dz: metres(below) })];
}

const OWN_SYSTEM: Record<string, string> = {
  'V-115': 'SYS-103',
  'L-505-1': 'SYS-503',
  'TK-502 suction line': 'SYS-502',
};

function endOf(line: DemoLine): Line['end'] {
  const end = line.ends_at;
  if (!end) return undefined;
  const pressure = maybeFigure(end.pressure);
  const own = end.equipment === undefined ? undefined : OWN_SYSTEM[end.equipment];
  return compact({
    to: ENDS[end.to] ?? 'atmosphere',
    header: end.header === undefined ? undefined : documentId(end.header),
    node: end.tie_in === undefined ? undefined : idOf('nd', end.tie_in),
    equipment: end.equipment,
    system: own === undefined ? undefined : documentId(own),
    pressure,
    pressureMax: pressure,
    location: end.location,
    direction: end.location?.includes('vertical') === true ? ('up' as const) : undefined,
    assessment:
      end.evaluation === undefined ? undefined : { text: rich(end.evaluation), by: personId('P-01') },
    near: nearOf(end.nearest_access),
  });
}

function lineOf(line: DemoLine, path: string[]): Line {
  const outlet = line.side === 'outlet';
  const open = line.ends_at?.to === 'atmosphere';
  return compact({
    id: idOf('ln', line.id),
    point: pointId(line.device),
    side: line.side,
    path,
    drawing: line.drawing,
    from: line.starts_at,
    selfDraining: true,
    pocket: false,
    lowPointDrain: outlet && open ? true : undefined,
    entersFrom: line.ends_at?.header === undefined ? undefined : ('above' as const),
    tracing: 'none' as const,
    end: endOf(line),
    support: outlet ? { ref: `Support drawing of ${line.drawing}` } : undefined,
  });
}

const sizeOf = (line: DemoLine, segment: DemoSegment): string =>
  [line.side, segment.nominal, segment.length.value, line.ends_at?.tie_in, line.ends_at?.equipment].join('|');

/** All lines of a system with their segments; a segment that carries the group is drawn once and stands in several paths. */
export function pipingOf(system: DemoSystem): Piping {
  const segments: Segment[] = [];
  const shared = new Map<string, string>();
  const lines = system.lines.map((line) => {
    const path = line.segments.map((segment) => {
      const common = segment.carries === 'group' ? shared.get(sizeOf(line, segment)) : undefined;
      if (common !== undefined) return common;
      const id = `sg_${slug(segment.id)}`;
      if (segment.carries === 'group') shared.set(sizeOf(line, segment), id);
      segments.push(segmentOf(segment, id, line.drawing));
      return id;
    });
    return lineOf(line, path);
  });
  return { lines, segments };
}
