/* Rules on what a disposition leans on: check valves, trips and people, conditions in the field, tested low sides. */
import { quantityOf, type Scenario, type Source } from '@domain/basis';
import { plainText } from '@domain/text';
import { toSI } from '@engine/quantity';
import { allowed, gt, onEquipment, onScenario, param, told } from '../reading';
import { type Hit, rule, type RuleContext } from '../types';
import { setAside } from './dispositions';

/** The check valves that a scenario names as sources or depends on. */
function checkValves(ctx: RuleContext, scenario: Scenario): Source[] {
  const tags = (scenario.dependsOn ?? [])
    .filter((item) => item.kind === 'check-valve')
    .map((item) => item.tag);
  const named = scenario.sources ?? [];
  return ctx.doc.sources.filter(
    (source) => source.kind === 'check-valve' && (named.includes(source.id) || tags.includes(source.tag)),
  );
}

function seriesProven(valves: readonly Source[]): boolean {
  return (
    valves.length >= 2 &&
    valves.every(({ check }) => check?.dissimilar === true && check.inspected !== undefined)
  );
}

/** True when a disposition or a load takes credit for a check valve. */
function creditsCheck(ctx: RuleContext, scenario: Scenario, valves: readonly Source[]): boolean {
  if (setAside(scenario)) {
    const leans = (scenario.dependsOn ?? []).some((item) => item.kind === 'check-valve');
    return (
      leans ||
      valves.length > 0 ||
      (scenario.key === 'check-valve-reverse-flow' && scenario.why === 'controlled')
    );
  }
  const series = scenario.answers.some(
    ({ load }) => load.by === 'method' && load.method.startsWith('f.check-valve-reverse-flow'),
  );
  return series && ctx.doc.sources.length > 0;
}

export const checkValveCredited = rule(
  {
    code: 'check-valve-credited',
    subject: 'scenario',
    statement: '{scenario} is set aside, or its load cut, because of a check valve.',
    condition:
      'One check valve: the load must count its forward coefficient or no resistance at all. Two unlike ones in series, inspected: a leak like an orifice of at least 10 % of the larger nominal diameter. Anything less, or no record of inspection, is not enough.',
    severity: 'stop',
    gate: 'scenarios',
    source: 'API 521 5th 4.3.4.2 as quoted [S]; 10 % diameter (reference topic) [S]',
    parameter: 'seriesLeakDiameter',
  },
  (ctx) =>
    ctx.doc.scenarios.flatMap((scenario): Hit[] => {
      if (scenario.disposition === undefined || scenario.disposition === 'not-applicable') return [];
      const valves = checkValves(ctx, scenario);
      if (!creditsCheck(ctx, scenario, valves) || seriesProven(valves)) return [];
      return [onScenario(scenario, { valves: valves.map((valve) => valve.tag).join(', ') })];
    }),
);

export const activeSafeguardCredited = rule(
  {
    code: 'active-safeguard-credited',
    subject: 'scenario',
    statement: '{scenario} depends on a trip, an alarm or a person who must act within {t} min.',
    condition:
      'Credit for an instrumented function without target and test reference, or where the site forbids it; or for a person with less than 20 minutes to act, or without an alarm of its own.',
    severity: 'justify',
    gate: 'scenarios',
    source: 'API 521 §5.4 5th: 10–30 min as quoted [S]; trips not credited for device sizing',
    parameter: 'operatorTime',
  },
  (ctx) =>
    ctx.doc.scenarios.flatMap((scenario): Hit[] =>
      (scenario.safeguards ?? [])
        .filter((safeguard) => {
          if (safeguard.kind === 'trip')
            return (
              !allowed(ctx, 'allowTripCredit', false) ||
              safeguard.target === undefined ||
              safeguard.test === undefined
            );
          const minutes = quantityOf(safeguard.minutes);
          const short = minutes === undefined || toSI(minutes) < param(ctx, 'operatorTime', 20) * 60 * 0.999;
          return short || safeguard.independentAlarm !== true;
        })
        .slice(0, 1)
        .map((safeguard) => {
          const minutes = quantityOf(safeguard.minutes);
          const t = minutes ? told(toSI(minutes) / 60, '-') : 'an unstated number of';
          return onScenario(
            scenario,
            { t },
            { field: `scenarios/${scenario.id}/safeguards/${safeguard.id}` },
          );
        }),
    ),
);

/** Words of a reason that name something to be seen in the plant. */
const CITED =
  /(?<![\w-])(locked (open|shut|closed)|car[- ]?seal(ed)?|lock number|spade[sd]?|(spectacle[- ]?)?blind(ed|s)?|blanked|travel stop|restriction orifice|removed spool|spool (is )?removed|impeller|governor|fails? (open|shut|closed))(?![\w-])/i;

/** Things in the plant that a scenario leans on but that nobody is asked to see. */
function unseen(ctx: RuleContext, scenario: Scenario): string | undefined {
  const listed = new Set(ctx.doc.fieldConditions.map((condition) => condition.id));
  const loose = (scenario.dependsOn ?? []).find(
    (item) => item.condition === undefined || !listed.has(item.condition),
  );
  if (loose) return loose.tag;
  if (
    (scenario.dependsOn ?? []).length > 0 ||
    !setAside(scenario) ||
    scenario.disposition === 'not-applicable'
  )
    return undefined;
  const cited = CITED.exec(plainText(scenario.reason));
  return cited ? `“${cited[0]}”` : undefined;
}

export const reasonWithoutFieldCheck = rule(
  {
    code: 'reason-without-field-check',
    subject: 'scenario',
    statement:
      '{scenario} depends on {condition}, which is not on the list of conditions to be seen in the field.',
    condition:
      'The reason rests on a lock, spade, travel stop, restriction orifice, removed spool, impeller size, governor or fail position, and no field condition has that tag.',
    severity: 'stop',
    gate: 'scenarios',
    source: 'trade practice, §5; [P]',
  },
  (ctx) =>
    ctx.doc.scenarios.flatMap((scenario): Hit[] => {
      const condition = unseen(ctx, scenario);
      return condition === undefined
        ? []
        : [onScenario(scenario, { condition }, { field: `scenarios/${scenario.id}/dependsOn` })];
    }),
);

export const tubeRuptureScreen = rule(
  {
    code: 'tube-rupture-screen',
    subject: 'equipment',
    statement:
      "The low side of {exchanger} was tested at {pt}, below the high side's {ph}: a broken tube cannot be set aside.",
    condition:
      'The corrected test pressure of the low side, exchanger or connected piping, is below the highest pressure of the high side, and the scenario is not credible. Double-pipe exchangers and others go by a written assessment.',
    severity: 'stop',
    gate: 'scenarios',
    source: 'corrected test pressure, API 521 5th 3.21/5.19 as quoted [S]; 10/13 where test = 1.3',
    parameter: 'highSideBasis',
  },
  (ctx) => {
    const credible = ctx.doc.scenarios.some(
      (scenario) => scenario.key === 'tube-rupture' && scenario.disposition === 'credible',
    );
    if (credible) return [];
    return ctx.doc.equipment
      .filter((equipment) => equipment.kind === 'exchanger' && equipment.sides.length === 2)
      .flatMap((equipment): Hit[] => {
        const low = equipment.sides.find((side) => side.holds === 'here');
        const high = equipment.sides.find((side) => side !== low);
        const test = quantityOf(low?.test);
        const ratio = quantityOf(low?.stressRatio);
        const design = ctx.rules.parameters['highSideBasis'] !== 'max-operating';
        const ph = design ? quantityOf(high?.ratings[0]?.mawp) : quantityOf(high?.operating?.max);
        if (!low || !test || !ph) return [];
        const corrected = toSI(test) * (ratio ? toSI(ratio) : 1);
        if (!gt(toSI(ph), corrected)) return [];
        return [
          onEquipment(equipment, { exchanger: equipment.tag, pt: test, ph }, { worse: toSI(ph) / corrected }),
        ];
      });
  },
);
