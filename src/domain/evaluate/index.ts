/* The public face of evaluation: from a relief basis to sheets, verdicts and flat figures. */
export * from './types';
export { enFireLimit } from './accumulation';
export { backPressureOf, outletOf, pointBackPressure } from './back-pressure';
export { externalInputsHash, externalsFor } from './external';
export { ENGINE, evaluate } from './evaluate';
export { solveFixedPoint } from './fixed-point';
export { INADEQUATE_ABOVE, scenarioOrder, verdictOf, worstOf } from './groups';
export { actualArea, areaKindOf, effectiveArea } from './installed';
export { catalogHash, evaluationKey, sheetHash } from './keys';
export { ratingFor } from './limits';
export { differenceUnit } from './points';
export { outputOf } from './sheets';
export { exposedIds } from './vessels';
export {
  codeOf,
  creditedMembers,
  credibleAnswers,
  isFireClass,
  limitingSide,
  lookupOf,
  type CredibleAnswer,
  type Lookup,
  type Member,
} from './work';
