/* The rules of the invented site: what Ketterwold has changed in the defaults of the rulebook. */
import { DEFAULT_RULES, type SiteRules } from '@domain/rules';

/** A margin of less than 10 % of the required area is marginal: use from 1/1.10 of the installed area. */
const MARGINAL_FROM = 0.909;

/** Rule set 1 of the site, in effect since the first day of its year. */
export function siteRules(from: string): SiteRules {
  const { judgement, conduct } = DEFAULT_RULES;
  return {
    number: 1,
    from,
    judgement: {
      ...judgement,
      barometer: { value: 0.918, unit: 'bar_abs' },
      parameters: { ...judgement.parameters, marginalFrom: MARGINAL_FROM },
    },
    conduct: { ...conduct, temporaryMax: 180 },
  };
}
