/* The public face of the rulebook: its document rules, what they say of a basis, and what clears them. */
export { blocking, clearedBy, judge, type JudgeInput, whereOf } from './judge';
export { ruleOf, RULEBOOK } from './rules';
export { fill } from './sentence';
export {
  type Judged,
  type Outcome,
  type Rule,
  type RuleContext,
  type RuleFacts,
  type RuleGate,
  type Severity,
} from './types';
