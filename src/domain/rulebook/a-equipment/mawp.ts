/* Rules on the MAWP and design temperature that everything is judged against. */
import { isKnown, quantityOf } from '@domain/basis';
import { ratingFor } from '@domain/evaluate';
import { type Q, toSI } from '@engine/quantity';
import {
  answersOf,
  gt,
  inUnitOf,
  isFire,
  limitOf,
  onEquipment,
  onGroup,
  onScenario,
  setMembers,
} from '../reading';
import { type Hit, rule, type RuleContext } from '../types';

const GRAVITY = 9.80665;

export const mawpMissing = rule(
  {
    code: 'mawp-missing',
    subject: 'equipment',
    statement: '{equipment} has no MAWP or design pressure, so nothing can be judged against it.',
    condition:
      'A side of some equipment in the system has no MAWP or design pressure, or no temperature that goes with it.',
    severity: 'stop',
    gate: 'scenarios',
    source: 'ASME VIII-1 UG-98 [M]; 46 CFR 54.10-5 [S] (MAWP goes with a designated temperature)',
  },
  (ctx) =>
    ctx.doc.equipment.flatMap((equipment) =>
      equipment.sides
        .filter((side) => side.holds === 'here')
        .filter(
          (side) =>
            side.ratings.length === 0 ||
            side.ratings.some((pair) => !isKnown(pair.mawp) || !isKnown(pair.at)),
        )
        .map((side) =>
          onEquipment(
            equipment,
            { side: side.name },
            { field: `equipment/${equipment.id}/sides/${side.id}/ratings` },
          ),
        ),
    ),
);

/** Static head, Pa, of a liquid-full path on the lowest point of an item below the device. */
function headOn(ctx: RuleContext, group: RuleContext['doc']['groups'][number], equipmentId: string): number {
  const elevation = quantityOf(ctx.lookup.equipment.get(equipmentId)?.elevation);
  const device = setMembers(ctx, group)[0]?.point;
  const top = quantityOf(device?.on?.elevation);
  const densities = answersOf(ctx, group)
    .filter((ca) => ca.answer.liquidFull === true)
    .flatMap((ca) => quantityOf(ctx.lookup.fluids.get(ca.answer.fluid ?? '')?.rhoLiquid) ?? []);
  if (!elevation || !top || densities.length === 0) return 0;
  const height = Math.max(0, toSI(top) - toSI(elevation));
  return Math.max(...densities.map((density) => toSI(density))) * GRAVITY * height;
}

export const mawpNotGoverning = rule(
  {
    code: 'mawp-not-governing',
    subject: 'group',
    statement: '{device} is judged against {equipment}, but {weaker} governs once static head is counted.',
    condition:
      'Another part has a lower MAWP, less the static head of liquid above its lowest point, than the one the group is judged against. Head counts only in scenarios with a path full of liquid; 0.1 % is allowed.',
    severity: 'stop',
    gate: 'scenarios',
    source:
      '46 CFR 54.10-5 [S]: MAWP is at the top of the vessel, least of all parts, adjusted for static head; ASME VIII-1 UG-98 [M]',
  },
  (ctx) =>
    ctx.doc.groups.flatMap((group): Hit[] => {
      const used = limitOf(ctx, group.limiting);
      if (!used) return [];
      const items = [
        {
          equipment: group.limiting.equipment,
          ...(group.limiting.side ? { side: group.limiting.side } : {}),
        },
        ...group.covers,
      ];
      const weighed = items.flatMap((item) => {
        const limit = limitOf(ctx, item);
        return limit?.side.holds === 'here'
          ? [{ limit, pa: limit.pa - headOn(ctx, group, item.equipment) }]
          : [];
      });
      const weakest = weighed.toSorted((a, b) => a.pa - b.pa)[0];
      if (!weakest || !gt(used.pa, weakest.pa)) return [];
      const device = setMembers(ctx, group)[0]?.point.tag ?? 'The group';
      const values = {
        device,
        equipment: used.equipment.tag,
        weaker: weakest.limit.equipment.tag,
        mawp: used.mawp,
        governs: inUnitOf(weakest.pa, used.mawp),
      };
      return [onGroup(ctx, group, values, { worse: used.pa / Math.max(weakest.pa, 1) })];
    }),
);

export const mawpTemperatureExceeded = rule(
  {
    code: 'mawp-temperature-exceeded',
    subject: 'scenario',
    statement: 'In {scenario}, {equipment} reaches {T}, above the {Td} for which its MAWP is stated.',
    condition:
      'The relieving temperature is more than 1 K above the temperature for which the MAWP is stated, in a scenario other than fire. In fire it is a note: the wall temperature is not a design condition.',
    severity: 'justify',
    gate: 'scenarios',
    source: 'ASME VIII-1 UG-98, UG-20 [M]; re-rating at the higher temperature must be referenced',
  },
  (ctx) =>
    ctx.answers.flatMap((ca): Hit[] => {
      const fluid = ctx.lookup.fluids.get(ca.answer.fluid ?? '');
      const T = quantityOf(ca.answer.T) ?? quantityOf(fluid?.T);
      const limit = limitOf(ctx, ca.answer.limiting ?? ca.group?.limiting);
      const rating = limit && ratingFor(limit.side, T);
      if (!T || !limit || !rating?.at || toSI(T) <= toSI(rating.at) + 1) return [];
      const values = { equipment: limit.equipment.tag, T, Td: rating.at };
      return [
        onScenario(ca.scenario, values, {
          worse: toSI(T),
          ...(isFire(ca) ? { severity: 'note' as const } : {}),
        }),
      ];
    }),
);

type Rise = { field: string; old: Q; now: Q };

export const mawpRaisedWithoutRerate = rule(
  {
    code: 'mawp-raised-without-rerate',
    subject: 'equipment',
    statement:
      'The MAWP or design temperature of {equipment} is higher than in the basis in force and no re-rating is referenced.',
    condition:
      'The MAWP or design temperature is higher, or the minimum metal temperature lower, than in the basis in force, and no re-rating on the list of references names the tag.',
    severity: 'stop',
    gate: 'scenarios',
    source: 'API 510 §7 re-rating [M]; trade practice',
    inheritable: false,
  },
  (ctx) =>
    ctx.doc.equipment.flatMap((equipment): Hit[] => {
      const before = ctx.prior?.doc.equipment.find((item) => item.id === equipment.id);
      if (!before) return [];
      const rerated = ctx.doc.references.some(
        (ref) => ref.kind === 'rerate' && ref.names.includes(equipment.tag),
      );
      if (rerated) return [];
      return equipment.sides.flatMap((side) => {
        const old = before.sides.find((item) => item.id === side.id);
        const risen = old && risesOf(side, old)[0];
        if (!risen) return [];
        const field = `equipment/${equipment.id}/sides/${side.id}/${risen.field}`;
        return [onEquipment(equipment, { old: risen.old, now: risen.now }, { field })];
      });
    }),
);

type AnySide = RuleContext['doc']['equipment'][number]['sides'][number];

function risesOf(side: AnySide, old: AnySide): Rise[] {
  const rises: Rise[] = [];
  const add = (field: string, a: Q | undefined, b: Q | undefined, up: boolean) => {
    if (a && b && (up ? gt(toSI(b), toSI(a)) : gt(toSI(a), toSI(b)))) rises.push({ field, old: a, now: b });
  };
  for (const rating of side.ratings) {
    const was = old.ratings.find((item) => item.id === rating.id);
    add(`ratings/${rating.id}/mawp`, quantityOf(was?.mawp), quantityOf(rating.mawp), true);
    add(`ratings/${rating.id}/at`, quantityOf(was?.at), quantityOf(rating.at), true);
  }
  add('mdmt', quantityOf(old.mdmt), quantityOf(side.mdmt), false);
  return rises;
}
