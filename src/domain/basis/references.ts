/* Ids that point nowhere: every reference within a basis leads to an element that is there. */
import type { Basis } from './basis';
import { describePath } from './describe';
import { capital } from './fields';
import type { Path } from './figures';
import { getAt } from './paths';

export type BrokenReference = { path: Path; sentence: string };
function nameOf(basis: Basis, path: Path): string {
  return capital(describePath(basis, path).label);
}

type Check = (path: Path, id: string | undefined, kind: keyof typeof LISTS) => void;

/** What can be pointed at, and where it stands. */
const LISTS = {
  equipment: 'equipment',
  source: 'sources',
  fluid: 'fluids',
  'relief point': 'reliefPoints',
  group: 'groups',
  interlock: 'interlocks',
  segment: 'segments',
  'external sheet': 'externalSheets',
  'field condition': 'fieldConditions',
} as const;

function checkEquipmentAndPoints(basis: Basis, check: Check): void {
  for (const { id, point, equipment } of basis.boundary.paths) {
    check(`boundary/paths/${id}/point`, point, 'relief point');
    check(`boundary/paths/${id}/equipment`, equipment, 'equipment');
  }
  for (const source of basis.sources) {
    check(`sources/${source.id}/equipment`, source.equipment, 'equipment');
    check(`sources/${source.id}/fluid`, source.fluid, 'fluid');
    check(`sources/${source.id}/valve/stop/condition`, source.valve?.stop?.condition, 'field condition');
    check(`sources/${source.id}/valve/bypass/condition`, source.valve?.bypass?.condition, 'field condition');
  }
  for (const point of basis.reliefPoints) {
    check(`reliefPoints/${point.id}/on/equipment`, point.on?.equipment, 'equipment');
    check(`reliefPoints/${point.id}/with/disk`, point.with?.disk, 'relief point');
  }
}

function checkGroups(basis: Basis, check: Check): void {
  for (const group of basis.groups) {
    check(`groups/${group.id}/limiting/equipment`, group.limiting.equipment, 'equipment');
    for (const one of group.covers)
      check(`groups/${group.id}/covers/${one.id}/equipment`, one.equipment, 'equipment');
    for (const one of group.members)
      check(`groups/${group.id}/members/${one.id}/point`, one.point, 'relief point');
    for (const id of group.makeUp ?? []) check(`groups/${group.id}/makeUp`, id, 'source');
  }
  for (const isolation of basis.isolations) {
    for (const id of isolation.protects) check(`isolations/${isolation.id}/protects`, id, 'relief point');
    check(`isolations/${isolation.id}/interlock`, isolation.interlock, 'interlock');
  }
  for (const interlock of basis.interlocks) {
    for (const { id, points } of interlock.shutTogether) {
      for (const point of points)
        check(`interlocks/${interlock.id}/shutTogether/${id}/points`, point, 'relief point');
    }
  }
  for (const line of basis.lines) {
    check(`lines/${line.id}/point`, line.point, 'relief point');
    for (const id of line.path) check(`lines/${line.id}/path`, id, 'segment');
  }
}

function checkScenarios(basis: Basis, check: Check): void {
  for (const scenario of basis.scenarios) {
    const at = `scenarios/${scenario.id}`;
    for (const id of scenario.sources ?? []) check(`${at}/sources`, id, 'source');
    for (const one of scenario.dependsOn ?? [])
      check(`${at}/dependsOn/${one.id}/condition`, one.condition, 'field condition');
    check(`${at}/bound/limit/equipment`, scenario.bound?.limit.equipment, 'equipment');
    for (const answer of scenario.answers) {
      const here = `${at}/answers/${answer.id}`;
      check(`${here}/fluid`, answer.fluid, 'fluid');
      check(`${here}/group`, answer.group, 'group');
      check(`${here}/limiting/equipment`, answer.limiting?.equipment, 'equipment');
      for (const part of ['load', 'size'] as const) {
        const calc = answer[part];
        if (calc.by === 'external') check(`${here}/${part}/sheet`, calc.sheet, 'external sheet');
      }
    }
  }
}

function sideReferences(basis: Basis): { path: Path; equipment: string; side: string | undefined }[] {
  return [
    ...basis.reliefPoints.map(({ id, on }) => ({
      path: `reliefPoints/${id}/on/side`,
      equipment: on?.equipment ?? '',
      side: on?.side,
    })),
    ...basis.groups.map(({ id, limiting }) => ({
      path: `groups/${id}/limiting/side`,
      ...limiting,
      side: limiting.side,
    })),
    ...basis.groups.flatMap(({ id, covers }) =>
      covers.map((one) => ({
        path: `groups/${id}/covers/${one.id}/side`,
        equipment: one.equipment,
        side: one.side,
      })),
    ),
    ...basis.scenarios.flatMap(({ id, bound }) =>
      bound ? [{ path: `scenarios/${id}/bound/limit/side`, ...bound.limit }] : [],
    ),
  ];
}

/**
 * Every id of a basis that points at nothing of that basis, in a sentence. What points into other documents or
 * registers (systems, utilities, files, people, headers) is for those who can see them.
 */
export function checkReferences(basis: Basis): BrokenReference[] {
  const ids = new Map(
    Object.entries(LISTS).map(([kind, list]) => [kind, new Set(basis[list].map((one) => one.id))]),
  );
  const broken: BrokenReference[] = [];
  const check: Check = (path, id, kind) => {
    if (id === undefined || ids.get(kind)?.has(id)) return;
    broken.push({
      path,
      sentence: `${nameOf(basis, path)} points at a ${kind} that is not in this basis.`,
    });
  };
  checkEquipmentAndPoints(basis, check);
  checkGroups(basis, check);
  checkScenarios(basis, check);
  for (const { path, equipment, side } of sideReferences(basis)) {
    const item = basis.equipment.find((one) => one.id === equipment);
    if (side === undefined || !item || item.sides.some((one) => one.id === side)) continue;
    broken.push({
      path,
      sentence: `${nameOf(basis, path)} points at a side that ${item.tag} does not have.`,
    });
  }
  return [...broken, ...brokenUses(basis)];
}

/** Inputs of the kind `use` whose path leads nowhere in the document. Paths of results (sheets/…) are the engine's to resolve. */
function brokenUses(basis: Basis): BrokenReference[] {
  return basis.scenarios.flatMap((scenario) =>
    scenario.answers.flatMap((answer) =>
      (['load', 'size'] as const).flatMap((part) => {
        const calc = answer[part];
        if (calc.by !== 'method') return [];
        return Object.entries(calc.inputs).flatMap(([name, input]) => {
          if (!('use' in input) || input.use.startsWith('sheets/') || getAt(basis, input.use) !== undefined)
            return [];
          const path = `scenarios/${scenario.id}/answers/${answer.id}/${part}/inputs/${name}`;
          return [
            {
              path,
              sentence: `${nameOf(basis, path)} takes its value from a place that is not there (${input.use}).`,
            },
          ];
        });
      }),
    ),
  );
}
