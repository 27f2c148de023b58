/* Rules on fire: what the heat input takes credit for, and the fire zone. */
import { type Equipment } from '@domain/basis';
import { type CredibleAnswer, exposedIds, type Sheet } from '@domain/evaluate';
import { isFire, onScenario, told } from './reading';
import { type Hit, rule, type RuleContext } from './types';

const LEAST_FACTOR = 0.026;

type FireCase = { ca: CredibleAnswer; sheet: Sheet; equipment: Equipment[] };

/** Fire answers with their load sheet and the equipment in it. */
function fires(ctx: RuleContext): FireCase[] {
  return ctx.answers.filter(isFire).flatMap((ca) => {
    const sheet = ctx.evaluation.sheets[`load:${ca.id}`];
    return sheet ? [{ ca, sheet, equipment: exposed(ctx, ca) }] : [];
  });
}

/** The equipment named in a fire load, else what the group protects. */
function exposed(ctx: RuleContext, ca: CredibleAnswer): Equipment[] {
  const { load } = ca.answer;
  const external = load.by === 'external' ? ctx.lookup.external.get(load.sheet)?.inputs : undefined;
  const entered = load.by === 'method' ? load.inputs : (external ?? {});
  const lists = Object.fromEntries(
    Object.entries(entered).flatMap(([name, input]) => ('list' in input ? [[name, input.list]] : [])),
  );
  const ids = exposedIds(ca, { lists });
  return ids.flatMap((id) => ctx.lookup.equipment.get(id) ?? []);
}

export const fireDrainageUnsupported = rule(
  {
    code: 'fire-drainage-unsupported',
    subject: 'scenario',
    statement:
      'The lower heat-input constant is used for {equipment} without drainage and prompt fire-fighting on record.',
    condition:
      'The constant for adequate drainage (43 200; US 21 000) is used and drainage is not referenced. Without it the constant is 70 900 (34 500).',
    severity: 'stop',
    gate: 'scenarios',
    source: 'trade practice; API 521 [M]; NFPA 30 drainage factors must not be combined',
  },
  (ctx) =>
    fires(ctx).flatMap(({ ca, sheet, equipment }): Hit[] => {
      if (sheet.inputs['adequate_drainage'] !== true) return [];
      return equipment
        .filter(({ fire }) => fire?.drainage !== true || (fire.drainageRef ?? '') === '')
        .slice(0, 1)
        .map((item) =>
          onScenario(
            ca.scenario,
            { equipment: item.tag },
            { field: `equipment/${item.id}/fire/drainageRef` },
          ),
        );
    }),
);

/** Why a factor below one is not supported by this equipment. */
function unsupported({ insulation, fire }: Equipment, F: number): boolean {
  if (F < LEAST_FACTOR * 0.999 || fire?.otherCredit !== undefined) return true;
  return insulation?.intactHot !== true || insulation.hoseStream !== true || insulation.banded !== true;
}

export const fireInsulationCredit = rule(
  {
    code: 'fire-insulation-credit',
    subject: 'scenario',
    statement: '{equipment} takes credit F = {F}, and nothing shows the insulation survives.',
    condition:
      'Insulation earns a factor below 1 without being shown to last two hours at 904 °C (1 660 °F) and to withstand a hose stream, with banding; or water spray or depressuring earns credit; or the factor is below 0.026, or a second one is multiplied in.',
    severity: 'stop',
    gate: 'scenarios',
    source: 'trade practice (≤ 4.0 Btu/(h·ft²·°F), hose stream); API 521 F table [M]',
  },
  (ctx) =>
    fires(ctx).flatMap(({ ca, sheet, equipment }): Hit[] => {
      const F = sheet.inputs['F'] ?? sheet.outputs['F'];
      if (typeof F !== 'object' || F.value >= 0.999) return [];
      return equipment
        .filter((item) => unsupported(item, F.value))
        .slice(0, 1)
        .map((item) =>
          onScenario(
            ca.scenario,
            { equipment: item.tag, F: told(F.value, '-') },
            { worse: -F.value, field: `equipment/${item.id}/insulation` },
          ),
        );
    }),
);

export const fireZoneMissing = rule(
  {
    code: 'fire-zone-missing',
    subject: 'scenario',
    statement: 'Fire is credible for {equipment} but it belongs to no fire zone.',
    condition:
      'Fire is credible and the fire zone is blank, so that header scenarios cannot be summed; or the area of the zone is outside 230 to 460 m².',
    severity: 'stop',
    gate: 'scenarios',
    source: 'API 521 zone 230–460 m² quoted [S]',
  },
  (ctx) =>
    fires(ctx).flatMap(({ ca, equipment }): Hit[] =>
      equipment
        .filter((item) => item.fire?.zone === undefined)
        .slice(0, 1)
        .map((item) =>
          onScenario(ca.scenario, { equipment: item.tag }, { field: `equipment/${item.id}/fire/zone` }),
        ),
    ),
);
