/* The rulebook as a page: every rule with its condition, its severity, the gate where it is first asked, and its parameter. */
import { RULEBOOK, type RuleFacts } from '@domain/rulebook';
import { ok, type Result } from '@domain/result';
import { rulesOf } from '../case-file';
import { type Actor, type Ctx } from '../context';

export type RuleLine = Omit<RuleFacts, 'parameter' | 'inheritable'> & {
  parameter?: { key: string; value: string };
  inheritable: boolean;
};
export type RulebookView = { rules: RuleLine[]; number: number };

/** Every rule, with the value that the site rules give its parameter. */
export async function rulebookView(ctx: Ctx, actor: Actor): Promise<Result<RulebookView>> {
  const { rules } = await rulesOf(ctx.db, actor.site.id);
  const { parameters } = rules.judgement;
  return ok({
    number: rules.number,
    rules: RULEBOOK.map((rule) => {
      const { code, subject, statement, condition, severity, gate, source, parameter } = rule;
      const value = parameter === undefined ? undefined : parameters[parameter];
      return {
        ...{ code, subject, statement, condition, severity, gate, source },
        inheritable: rule.inheritable !== false,
        ...(parameter === undefined
          ? {}
          : { parameter: { key: parameter, value: value === undefined ? 'default' : String(value) } }),
      };
    }),
  });
}
