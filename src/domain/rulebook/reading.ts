/* Small readings that many rules share: limits and members of groups, names as the user reads them, comparison with tolerance. */
import {
  type Equipment,
  type Fluid,
  type Group,
  type Path,
  quantityOf,
  type ReliefPoint,
  type Scenario,
  type Side,
} from '@domain/basis';
import {
  type CredibleAnswer,
  creditedMembers,
  limitingSide,
  outputOf,
  ratingFor,
  codeOf,
} from '@domain/evaluate';
import { SCENARIOS } from '@domain/scenarios';
import { type Q, toSI } from '@engine/quantity';
import { type Hit, type RuleContext } from './types';

/** Greater by more than the 0.1 % that the rounding of units may make. */
export function gt(a: number, b: number): boolean {
  return a - b > Math.abs(b) * 0.001;
}

/** A figure of the site's rules, or the rulebook's own. */
export function param(ctx: RuleContext, key: string, fallback: number): number {
  const value = ctx.rules.parameters[key];
  return typeof value === 'number' ? value : fallback;
}

/** A yes or no of the site's rules, or the rulebook's own. */
export function allowed(ctx: RuleContext, key: string, fallback: boolean): boolean {
  const value = ctx.rules.parameters[key];
  return typeof value === 'boolean' ? value : fallback;
}

/** A share as a percentage with the digits that a reader wants. */
export function percent(share: number): Q {
  return { value: Number((share * 100).toPrecision(3)), unit: '%' };
}

/** A worked quantity told with four significant digits. */
export function told(value: number, unit: string): Q {
  return { value: Number(value.toPrecision(4)), unit };
}

const NAMES = new Map(SCENARIOS.map((scenario) => [scenario.key, scenario.name]));

/** The trade's name of a scenario; a second instance carries its number. */
export function scenarioName(scenario: Scenario): string {
  const [key = scenario.key, instance] = scenario.id.split('~');
  const name = NAMES.get(scenario.key) ?? NAMES.get(key) ?? scenario.key;
  return instance === undefined ? name : `${name} (${instance})`;
}

/** The name of a group, else the tags of its members. */
export function groupName(ctx: RuleContext, group: Group): string {
  return (
    group.name ?? group.members.map((member) => ctx.lookup.points.get(member.point)?.tag ?? '?').join(' + ')
  );
}

export type Limit = { equipment: Equipment; side: Side; mawp: Q; pa: number; en: boolean };

/** The MAWP that a group is judged against (the lowest pair of its limiting side). */
export function limitOf(
  ctx: RuleContext,
  limiting: { equipment: string; side?: string } | undefined,
): Limit | undefined {
  const found = limitingSide(ctx.lookup, limiting);
  const rating = found && ratingFor(found.side, undefined);
  if (!found || !rating) return undefined;
  return {
    ...found,
    mawp: rating.mawp,
    pa: toSI(rating.mawp),
    en: codeOf(found.side, ctx.doc).basis === 'en',
  };
}

export type SetMember = { point: ReliefPoint; set: Q; pa: number; fireOnly: boolean };

/** The credited members in service of a group that have a set pressure, lowest first; vacuum devices left out. */
export function setMembers(ctx: RuleContext, group: Group): SetMember[] {
  return creditedMembers(ctx.lookup, group)
    .flatMap(({ point, place }) => {
      const set = quantityOf(point.set);
      if (!set || point.axes.direction === 'under') return [];
      const fireOnly = place === 'supplementary-fire' || point.purpose === 'supplementary-fire';
      return [{ point, set, pa: toSI(set), fireOnly }];
    })
    .toSorted((a, b) => a.pa - b.pa);
}

/** The credible answers of a group. */
export function answersOf(ctx: RuleContext, group: Group): CredibleAnswer[] {
  return ctx.answers.filter((ca) => ca.group?.id === group.id);
}

/** The groups in which a relief point is a member. */
export function groupsOf(ctx: RuleContext, point: ReliefPoint): Group[] {
  return ctx.doc.groups.filter((group) => group.members.some((member) => member.point === point.id));
}

/** The credible answers that a relief point counts for as capacity. */
export function answersOfPoint(ctx: RuleContext, point: ReliefPoint): CredibleAnswer[] {
  return ctx.answers.filter(
    (ca) =>
      ca.group &&
      creditedMembers(ctx.lookup, ca.group, ca.answer).some((member) => member.point.id === point.id),
  );
}

/** Whether a scenario is fire. */
export function isFire(ca: CredibleAnswer): boolean {
  return (
    ca.scenario.key.startsWith('fire') ||
    ca.answer.accumulation === 'fire' ||
    ca.answer.accumulation === 'storage-fire'
  );
}

/** Relieving pressure that the sheets of an answer used, Pa gauge: the size sheet's own P1 first, else the limit sheet's. */
export function reliefPa(ctx: RuleContext, ca: CredibleAnswer): number | undefined {
  const size = ctx.evaluation.sheets[`size:${ca.id}`];
  const p1 = size?.inputs['P1'] ?? size?.inputs['p0'];
  if (typeof p1 === 'object') return gaugePa(ctx, p1);
  const relieving = outputOf(ctx.evaluation.sheets[`limit:${ca.id}`], 'relieving_pressure');
  return relieving && toSI(relieving);
}

/** A pressure reading in Pa gauge. */
export function gaugePa(ctx: RuleContext, q: Q): number {
  return /abs$|psia$|^atm$/.test(q.unit) ? toSI(q) - toSI(ctx.rules.barometer) : toSI(q);
}

/** An output of a sheet of the evaluation. */
export function output(ctx: RuleContext, key: string, name: string): Q | undefined {
  return outputOf(ctx.evaluation.sheets[key], name);
}

/** Pa gauge told in the unit of another pressure. */
export function inUnitOf(pa: number, like: Q): Q {
  const factor = toSI({ value: 1, unit: like.unit }) - toSI({ value: 0, unit: like.unit });
  return told(pa / factor, like.unit);
}

/** The overpressure that an answer allows a set pressure: relieving pressure over set, less one. */
export function overpressureOf(ctx: RuleContext, ca: CredibleAnswer, setPa: number): number | undefined {
  const relief = reliefPa(ctx, ca);
  return relief === undefined || setPa <= 0 ? undefined : relief / setPa - 1;
}

/** Starts a hit on a relief point. */
export function onPoint(point: ReliefPoint, values: Hit['values'], extra: Partial<Hit> = {}): Hit {
  return {
    subject: `reliefPoints/${point.id}`,
    tag: point.tag,
    values: { device: point.tag, ...values },
    ...extra,
  };
}

/** Starts a hit on a group. */
export function onGroup(
  ctx: RuleContext,
  group: Group,
  values: Hit['values'],
  extra: Partial<Hit> = {},
): Hit {
  const name = groupName(ctx, group);
  return { subject: `groups/${group.id}`, tag: name, values: { group: name, ...values }, ...extra };
}

/** Starts a hit on a scenario. */
export function onScenario(scenario: Scenario, values: Hit['values'], extra: Partial<Hit> = {}): Hit {
  const subject: Path = `scenarios/${scenario.id}`;
  return { subject, tag: scenario.id, values: { scenario: scenarioName(scenario), ...values }, ...extra };
}

/** Starts a hit on a piece of equipment. */
export function onEquipment(equipment: Equipment, values: Hit['values'], extra: Partial<Hit> = {}): Hit {
  return {
    subject: `equipment/${equipment.id}`,
    tag: equipment.tag,
    values: { equipment: equipment.tag, ...values },
    ...extra,
  };
}

/** Answers with their fluid. */
export function withFluid(ctx: RuleContext): { ca: CredibleAnswer; fluid: Fluid }[] {
  return ctx.answers.flatMap((ca) => {
    const fluid = ctx.lookup.fluids.get(ca.answer.fluid ?? '');
    return fluid ? [{ ca, fluid }] : [];
  });
}

/** The fluid of an answer. */
export function fluidOf(ctx: RuleContext, ca: CredibleAnswer): Fluid | undefined {
  return ctx.lookup.fluids.get(ca.answer.fluid ?? '');
}
