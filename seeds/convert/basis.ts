/* A system of the invented site as a relief basis. */
import { type Basis, type Import } from '@domain/basis';
import { externalInputsHash } from '@domain/evaluate';
import { type DemoResults, type DemoSystem } from './demo-types';
import { equipmentOf, placeOf } from './equipment';
import { rich } from './figures';
import { fluidOf } from './fluids';
import { groupOf, interlocksOf, isolationsOf } from './groups';
import { documentId, idOf, unitId } from './ids';
import { pipingOf } from './lines';
import { conditionsOf, justificationsOf, neighboursOf, onceOf, referencesOf } from './papers';
import { pointId, pointOf } from './points';
import { scenariosOf } from './scenarios';
import { sourcesOf } from './sources';

/** One path a relief point, from the limiting item of its group; the valves on the drawing are those of the register. */
function pathsOf(system: DemoSystem): Basis['boundary']['paths'] {
  const valves = isolationsOf(system).filter((isolation) => isolation.where === 'inlet');
  return system.groups.flatMap((group) =>
    group.devices.map((tag) => ({
      id: idOf('bp', group.id, tag),
      equipment: placeOf(group.limiting_equipment).equipment,
      point: pointId(tag),
      valvesOnDrawing: valves.filter((valve) => valve.protects.includes(pointId(tag))).length,
      drawing: system.references[0] ?? '',
    })),
  );
}

/** Pins of header revision 1, one a header that the system discharges into. */
function importsOf(system: DemoSystem): Import[] {
  const ends = system.lines.flatMap((line) => (line.ends_at?.header === undefined ? [] : [line.ends_at]));
  const pins = new Map(ends.map((end) => [end.header ?? '', end.tie_in ?? '']));
  return [...pins].map(([header, node]) => ({
    id: idOf('im', header),
    header: documentId(header),
    revision: 1,
    node: idOf('nd', node),
  }));
}

function assembled(system: DemoSystem, results: DemoResults): Basis {
  const { lines, segments } = pipingOf(system);
  const { scenarios, sheets } = scenariosOf(system, results);
  return {
    schema: 1,
    id: documentId(system.id),
    tag: system.id,
    name: system.name,
    unit: unitId(system.unit),
    service: system.service,
    units: system.unit_system,
    grade: 'worked',
    boundary: { text: rich(system.boundary), paths: pathsOf(system) },
    equipment: system.equipment.map((equipment) => equipmentOf(equipment, system)),
    sources: sourcesOf(system),
    fluids: system.fluids.map(fluidOf),
    reliefPoints: system.devices.map((device) => pointOf(device, system)),
    groups: system.groups.map((group) => groupOf(group, system)),
    isolations: isolationsOf(system),
    interlocks: interlocksOf(system),
    segments,
    lines,
    scenarios,
    externalSheets: sheets,
    fieldConditions: conditionsOf(system),
    references: referencesOf(system),
    once: onceOf(system),
    assumptions: system.assumptions.map((text, n) => ({ id: `as_${String(n + 1)}`, text: rich(text) })),
    justifications: justificationsOf(system),
    neighbours: neighboursOf(system),
    imports: importsOf(system),
  };
}

/** The relief basis of a system; its external sheets carry the given stored results and say of which inputs they were made. */
export function basisOf(system: DemoSystem, results: DemoResults): Basis {
  const basis = assembled(system, results);
  const made = basis.externalSheets.map((sheet) => ({ ...sheet, madeOf: externalInputsHash(basis, sheet) }));
  return { ...basis, externalSheets: made };
}
