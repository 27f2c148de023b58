/* Reads an evaluation for the registers: the governing answer of a group and the figures of its sheets. */
import {
  type Basis,
  describePath,
  type Group,
  type Id,
  quantityOf,
  type ReliefPoint,
  type Scenario,
} from '@domain/basis';
import { actualArea, effectiveArea, type Evaluation, type SheetKey } from '@domain/evaluate';
import { fromSI, type Q } from '@engine/quantity';

/** The scenario of a sheet key `size:<scenario>/<answer>`. */
export function scenarioOfKey(basis: Basis, key: SheetKey | undefined): Scenario | undefined {
  const id = key?.slice(key.indexOf(':') + 1).split('/')[0];
  return basis.scenarios.find((scenario) => scenario.id === id);
}

/** The name of a scenario as a reader sees it. */
export function scenarioLabel(basis: Basis, scenario: Scenario): string {
  return describePath(basis, `scenarios/${scenario.id}`).label;
}

/** The name of a group: its own, else the tags of its members. */
export function groupLabel(basis: Basis, group: Group): string {
  return (
    group.name ??
    group.members
      .map(({ point }) => basis.reliefPoints.find(({ id }) => id === point)?.tag ?? '?')
      .join(' + ')
  );
}

/** A flat figure that is a quantity. */
export function figure(evaluation: Evaluation, path: string): Q | undefined {
  const found = evaluation.figures[path];
  return typeof found === 'object' ? found : undefined;
}

/** The group with the largest use; one that is not sized comes last. */
export function leadingGroup(basis: Basis, evaluation: Evaluation, ids?: readonly Id[]): Group | undefined {
  const among = basis.groups.filter((group) => ids === undefined || ids.includes(group.id));
  return among.toSorted(
    (a, b) => (evaluation.groups[b.id]?.use ?? -1) - (evaluation.groups[a.id]?.use ?? -1),
  )[0];
}

/** Orifice letters of the credited members, "L+L"; the inlet size where there is no letter. */
export function lettersOf(basis: Basis, group: Group): string | null {
  const letters = group.members
    .filter((member) => member.credited)
    .flatMap((member) => basis.reliefPoints.find(({ id }) => id === member.point) ?? [])
    .map((point) => letterOf(point));
  return letters.length > 0 && letters.every((letter) => letter !== null) ? letters.join('+') : null;
}

/** The orifice letter of a relief point, else its inlet size. */
export function letterOf(point: ReliefPoint): string | null {
  return point.orifice.letter ?? point.inlet?.nominal ?? null;
}

/** The area of a relief point: effective where it has one, else actual. */
export function areaOf(point: ReliefPoint, units: Basis['units']): Q | undefined {
  const entered = quantityOf(point.orifice.effective) ?? quantityOf(point.orifice.actual);
  if (entered) return entered;
  const m2 = effectiveArea(point, units) ?? actualArea(point, point.axes.direction === 'under');
  return m2 === undefined ? undefined : fromSI(m2, units === 'US' ? 'in2' : 'mm2');
}
