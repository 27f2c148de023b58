/* The rulebook as a page: every rule with its condition, its severity, the gate where it is first asked, and its parameter. */
import { RULEBOOK, type RuleFacts, type RuleGate } from '@domain/rulebook';
import { ok, type Result } from '@domain/result';
import { PARAMETERS } from '@domain/rules';
import { formatNumber } from '@engine/quantity';
import { rulesOf } from '../case-file';
import { type Actor, type Ctx } from '../context';
import { ruleName } from './rule-words';

export type RuleLine = Omit<RuleFacts, 'parameter' | 'inheritable'> & {
  parameter?: { meaning: string; value: string };
  inheritable: boolean;
  /** The code as words. */
  name: string;
  /** The stage that is left at the gate where the rule is first asked. */
  asked: string;
};
export type RulebookView = { rules: RuleLine[]; number: number };

const ASKED: Record<RuleGate, string> = {
  draft: 'draft',
  scenarios: 'scenario analysis',
  check: 'calculation check',
  approval: 'approval',
  field: 'field verification',
  removal: 'due for removal',
  'in-kind': 'replacement in kind',
  watch: 'while in force',
};

function limitOf(key: string, given: number | string | boolean | undefined): RuleLine['parameter'] {
  const parameter = PARAMETERS.find((one) => one.key === key);
  const value = given ?? parameter?.default;
  if (!parameter || value === undefined) return undefined;
  const { meaning, unit } = parameter;
  if (typeof value === 'boolean') return { meaning, value: value ? 'yes' : 'no' };
  if (typeof value === 'string') return { meaning, value };
  if (/^fraction|^of |^share/.test(unit)) {
    const of = unit.replace(/^fraction ?/, '');
    return { meaning, value: `${formatNumber(value * 100, undefined)}\u00a0%${of === '' ? '' : ` ${of}`}` };
  }
  return { meaning, value: `${formatNumber(value)}${unit === '-' || unit === '' ? '' : `\u00a0${unit}`}` };
}

/** Every rule, with the value that the site rules give its parameter. */
export async function rulebookView(ctx: Ctx, actor: Actor): Promise<Result<RulebookView>> {
  const { rules } = await rulesOf(ctx.db, actor.site.id);
  const { parameters } = rules.judgement;
  return ok({
    number: rules.number,
    rules: RULEBOOK.map((rule) => {
      const { code, subject, statement, condition, severity, gate, source, parameter } = rule;
      const limit = parameter === undefined ? undefined : limitOf(parameter, parameters[parameter]);
      return {
        ...{ code, subject, statement, condition, severity, gate, source },
        name: ruleName(code),
        asked: ASKED[gate],
        inheritable: rule.inheritable !== false,
        ...(limit ? { parameter: limit } : {}),
      };
    }),
  });
}
