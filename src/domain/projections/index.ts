/* The public face of projections: register rows and the facts of a relief point. */
export { type PointFacts, pointFacts, type Rung, type RungKind } from './ladder';
export { groupLabel, leadingGroup, scenarioLabel, scenarioOfKey } from './read';
export {
  type ConditionRow,
  type PointRow,
  type ProjectionFacts,
  type RowHead,
  type ScenarioRow,
  type SystemRow,
  type Truth,
} from './rows';
export { SHEET_KINDS, sheetLabel } from './sheet-label';
export { kindOf, projectSystem, type SystemProjection } from './system';
