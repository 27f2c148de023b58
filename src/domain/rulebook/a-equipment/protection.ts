/* Rules on what protects equipment: vacuum, equipment without a device, valves on the way. */
import { quantityOf, type Equipment, type Group, type Scenario, type Side } from '@domain/basis';
import { plainText } from '@domain/text';
import { codeOf, limitingSide } from '@domain/evaluate';
import { type Q, toSI } from '@engine/quantity';
import { limitOf, onEquipment } from '../reading';
import { type Hit, rule, type RuleContext } from '../types';

/** External rating of a side in Pa below atmosphere; a full-vacuum rating is the site's barometer. */
function externalPa(ctx: RuleContext, side: Side): number | undefined {
  if (side.external === undefined || side.external === 'none') return undefined;
  if (side.external === 'full-vacuum') return toSI(ctx.rules.barometer);
  const q = quantityOf(side.external);
  return q && Math.abs(toSI(q));
}

function answersVacuum(ctx: RuleContext, group: Group | undefined): boolean {
  if (!group) return false;
  if ((group.makeUp ?? []).length > 0) return true;
  return group.members.some((member) => {
    const point = ctx.lookup.points.get(member.point);
    return (
      member.credited &&
      point !== undefined &&
      point.axes.direction !== 'over' &&
      point.service === 'in-service'
    );
  });
}

function ratingWords(side: Side): Q | string {
  if (side.external === undefined) return 'not stated';
  if (typeof side.external === 'string') return side.external === 'none' ? 'none' : 'full vacuum';
  return quantityOf(side.external) ?? 'not known';
}

function credibleVacuum(ctx: RuleContext): Hit[] {
  return ctx.answers.flatMap((ca) => {
    const lowest = quantityOf(ca.answer.lowest);
    if (ca.scenario.key !== 'vacuum' && ca.answer.accumulation !== 'tank-vacuum') return [];
    const found = limitingSide(ctx.lookup, ca.answer.limiting ?? ca.group?.limiting);
    if (!found || answersVacuum(ctx, ca.group)) return [];
    const external = externalPa(ctx, found.side);
    if (external !== undefined && (!lowest || -toSI(lowest) <= external * 1.001)) return [];
    return [
      vacuumHit(
        ca.scenario,
        found.equipment,
        lowest ?? 'a vacuum',
        ratingWords(found.side),
        lowest ? -toSI(lowest) : 0,
      ),
    ];
  });
}

function vacuumHit(
  scenario: Scenario,
  equipment: Equipment,
  pv: Q | string,
  x: Q | string,
  worse: number,
): Hit {
  return onEquipment(
    equipment,
    { scenario: scenario.key === 'vacuum' ? 'Vacuum' : scenario.key, pv, x },
    { worse },
  );
}

function setAsideVacuum(ctx: RuleContext): Hit[] {
  const barometer = toSI(ctx.rules.barometer);
  return ctx.doc.scenarios
    .filter(
      (scenario) =>
        scenario.key === 'vacuum' &&
        scenario.disposition !== undefined &&
        scenario.disposition !== 'credible',
    )
    .filter((scenario) => /full vacuum/i.test(plainText(scenario.reason)))
    .flatMap((scenario) =>
      ctx.doc.equipment.flatMap((equipment) =>
        equipment.sides
          .filter((side) => side.holds === 'here' && (externalPa(ctx, side) ?? 0) < barometer * 0.999)
          .filter(
            (side) =>
              (scenario.about ?? [equipment.id]).includes(equipment.id) ||
              (scenario.about ?? []).includes(side.id),
          )
          .map((side) => vacuumHit(scenario, equipment, 'full vacuum', ratingWords(side), barometer)),
      ),
    );
}

export const vacuumUnprotected = rule(
  {
    code: 'vacuum-unprotected',
    subject: 'equipment',
    statement:
      '{scenario} can pull {equipment} to {pv}, and its external rating is {x} with no vacuum relief or make-up gas that answers it.',
    condition:
      'A vacuum scenario is credible, the external rating is missing or too small for it, and no vacuum device or make-up gas answers it. Also when vacuum is set aside as “rated for full vacuum” and the external rating is below the site’s barometer.',
    severity: 'stop',
    gate: 'scenarios',
    source: 'API 521 7th, API 2000 7th [M]; trade practice',
  },
  (ctx) => [...credibleVacuum(ctx), ...setAsideVacuum(ctx)],
);

function coveredIds(ctx: RuleContext): Set<string> {
  return new Set(
    ctx.doc.groups.flatMap((group) => [
      group.limiting.equipment,
      ...group.covers.map((item) => item.equipment),
    ]),
  );
}

/** Protected by system design: the source can't pass the MAWP, with a written analysis and an acceptance. */
function statedWithout(ctx: RuleContext, equipment: Equipment): boolean {
  const none = equipment.noDevice;
  if (!none) return false;
  if (none.reason !== 'system-design') return true;
  const max = none.sourceMax && 'value' in none.sourceMax ? toSI(none.sourceMax) : undefined;
  const limit = limitOf(ctx, { equipment: equipment.id });
  const bounded = max !== undefined && limit !== undefined && max <= limit.pa * 1.001;
  return bounded && none.analysis !== undefined && none.acceptedBy !== undefined;
}

export const equipmentUnprotected = rule(
  {
    code: 'equipment-unprotected',
    subject: 'equipment',
    statement: '{equipment} has no device and no statement of why none is needed.',
    condition:
      'No group covers the item and no reason is given; or it is protected by system design without a source that cannot exceed the MAWP, a written analysis and an acceptance.',
    severity: 'stop',
    gate: 'scenarios',
    source: 'ASME VIII-1 2019 UG-125(a), UG-140 [S]; UG-125(g) [S]',
  },
  (ctx) => {
    const covered = coveredIds(ctx);
    return ctx.doc.equipment
      .filter((equipment) => equipment.sides.some((side) => side.holds === 'here'))
      .filter((equipment) => !covered.has(equipment.id) && !statedWithout(ctx, equipment))
      .map((equipment) =>
        onEquipment(equipment, { code: codeOf(equipment.sides[0] as Side, ctx.doc).basis }),
      );
  },
);

export const boundaryValveUnregistered = rule(
  {
    code: 'boundary-valve-unregistered',
    subject: 'equipment',
    statement: 'A valve that can separate {equipment} from {device} is not in the isolation list.',
    condition:
      'The valves in the path counted on the P&ID are not as many as the isolations listed there, or the count is blank.',
    severity: 'stop',
    gate: 'scenarios',
    source: 'ASME VIII-1 2015 UG-135(d) [S]; CSB Williams Geismar 2013',
  },
  (ctx) =>
    ctx.doc.boundary.paths.flatMap((path): Hit[] => {
      const equipment = ctx.lookup.equipment.get(path.equipment);
      const point = ctx.lookup.points.get(path.point);
      if (!equipment || !point) return [];
      const listed = ctx.doc.isolations.filter(
        (valve) => valve.where !== 'outlet' && valve.protects.includes(point.id),
      ).length;
      if (path.valvesOnDrawing === listed) return [];
      const drawn = path.valvesOnDrawing === undefined ? 'not counted' : String(path.valvesOnDrawing);
      const values = { device: point.tag, drawn, listed: String(listed) };
      return [onEquipment(equipment, values, { field: `boundary/paths/${path.id}/valvesOnDrawing` })];
    }),
);
