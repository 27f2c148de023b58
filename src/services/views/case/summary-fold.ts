/* What the summary to sign folds: the parts that this case did not move. They stay part of what is signed. */
import { type OutcomeView } from './outcomes';
import { type SummaryView } from './summary';

export type Folded = {
  /** Outcomes in view: what this case justified, and what no one owns yet. */
  shown: OutcomeView[];
  /** Outcomes that stood before and are settled. */
  outcomes: OutcomeView[];
  /** What is folded, each with its count. */
  words: string[];
};

/** Inherited outcomes stay in view while they are this few and the case has one system. */
const FEW = 2;

function counted(count: number, one: string, many: string): string[] {
  return count === 0 ? [] : [`${String(count)} ${count === 1 ? one : many}`];
}

/** Parts the summary into what stands in view and what is folded. */
export function folded(view: SummaryView, several: boolean): Folded {
  const all = [...view.justified, ...view.inherited];
  const settled = all.filter((one) => one.inherited && (one.justification ?? one.deficiency) !== undefined);
  const outcomes = several || settled.length > FEW ? settled : [];
  const scenarios = view.notExamined.reduce((sum, one) => sum + one.scenarios.length, 0);
  const conditions = view.conditions.filter((one) => one.change === 'same').length;
  const papers = view.papers.length > 3 ? view.papers.length : 0;
  return {
    shown: all.filter((one) => !outcomes.includes(one)),
    outcomes,
    words: [
      ...counted(outcomes.length, 'outcome from before', 'outcomes from before'),
      ...counted(scenarios, 'scenario not examined again', 'scenarios not examined again'),
      ...counted(conditions, 'condition as before', 'conditions as before'),
      ...counted(papers, 'paper', 'papers'),
    ],
  };
}
