/* What one evaluation carries while it works: the basis, its look-ups, the site's figures and the sheets made so far. */
import {
  type Basis,
  type Answer,
  type Code,
  type Equipment,
  type ExternalSheet,
  type Fluid,
  type Group,
  type Id,
  type ReliefPoint,
  type Scenario,
  type Side,
} from '@domain/basis';
import { type JudgementRules } from '@domain/rules';
import { type QuantityContext } from '@engine/quantity';
import { type ImportSet, type Sheet, type SheetKey } from './types';

/** One answer of a credible scenario: the unit for which limit, load and size sheets are made. */
export type CredibleAnswer = { scenario: Scenario; answer: Answer; id: string; group?: Group };

export type Lookup = {
  equipment: ReadonlyMap<Id, Equipment>;
  points: ReadonlyMap<Id, ReliefPoint>;
  fluids: ReadonlyMap<Id, Fluid>;
  groups: ReadonlyMap<Id, Group>;
  external: ReadonlyMap<Id, ExternalSheet>;
};

export type Work = {
  basis: Basis;
  rules: JudgementRules;
  imports: ImportSet;
  context: QuantityContext;
  lookup: Lookup;
  answers: readonly CredibleAnswer[];
  sheets: Record<SheetKey, Sheet>;
  /** Load sheets being made just now: a sum or a use that comes back to one of them runs in a circle. */
  busy: Set<SheetKey>;
};

/** A member of a group together with its relief point. */
export type Member = { point: ReliefPoint; place: Group['members'][number]['place'] };

function byId<T extends { id: Id }>(list: readonly T[]): ReadonlyMap<Id, T> {
  return new Map(list.map((item) => [item.id, item]));
}

/** Look-ups by id over the lists of a basis. */
export function lookupOf(basis: Basis): Lookup {
  return {
    equipment: byId(basis.equipment),
    points: byId(basis.reliefPoints),
    fluids: byId(basis.fluids),
    groups: byId(basis.groups),
    external: byId(basis.externalSheets),
  };
}

/** The answers of credible scenarios, in the order of the document. `id` is `<scenario>/<answer>`. */
export function credibleAnswers(basis: Basis, lookup: Lookup): CredibleAnswer[] {
  return basis.scenarios
    .filter((scenario) => scenario.disposition === 'credible')
    .flatMap((scenario) =>
      scenario.answers.map((answer) => {
        const group = answer.group === undefined ? undefined : lookup.groups.get(answer.group);
        return { scenario, answer, id: `${scenario.id}/${answer.id}`, ...(group ? { group } : {}) };
      }),
    );
}

/** True for the accumulation classes that belong to fire. */
export function isFireClass(answer: Answer): boolean {
  return answer.accumulation === 'fire' || answer.accumulation === 'storage-fire';
}

/** The relief points of a group that count as capacity for an answer: credited, in service, and for fire only where they are fire devices. */
export function creditedMembers(lookup: Lookup, group: Group, answer?: Answer): Member[] {
  return group.members.flatMap((member) => {
    const point = lookup.points.get(member.point);
    if (!point || !member.credited || member.place === 'spare' || point.service !== 'in-service') return [];
    const fireOnly = member.place === 'supplementary-fire' || point.purpose === 'supplementary-fire';
    if (fireOnly && answer && !isFireClass(answer)) return [];
    return [{ point, place: member.place }];
  });
}

/** The equipment side against which an answer is judged: the answer's own, else its group's, else the first side that holds pressure here. */
export function limitingSide(
  lookup: Lookup,
  limiting: { equipment: Id; side?: Id } | undefined,
): { equipment: Equipment; side: Side } | undefined {
  const equipment = limiting && lookup.equipment.get(limiting.equipment);
  if (!equipment) return undefined;
  const side = limiting.side
    ? equipment.sides.find((candidate) => candidate.id === limiting.side)
    : (equipment.sides.find((candidate) => candidate.holds === 'here') ?? equipment.sides[0]);
  return side && { equipment, side };
}

/** The code that judges a side; a side without one is read in the units of its document, as ASME VIII-1. */
export function codeOf(side: Side, basis: Basis): Code {
  return side.code ?? { basis: 'asme-viii-1', units: basis.units };
}
