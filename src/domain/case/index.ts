/* The public face of the case: its records, who may do what, its gates, the unseen check and what a signature binds. */
export * from './types';
export * from './brief';
export * from './words';
export * from './permissions';
export * from './independence';
export * from './gate-facts';
export * from './gates';
export { isGraded, NO_PAPERS } from './gates/draft';
export { missingApprovers } from './gates/approval';
export { entryOf, installersOf } from './gates/field';
export { deficiencyOf, isJustified } from './gates/outcomes';
export { scenarioName } from './gates/scenarios';
export * from './agreements';
export * from './unseen';
export * from './unseen-compare';
export {
  chosenScenario,
  governingScenario,
  groupsToCheck,
  originatorsValue,
  type UnseenItem,
} from './unseen-items';
export { toleranceOf, TOLERANCES, type Tolerance, type UnseenQuantity } from './unseen-tolerances';
export { lengthOf } from './rich-text';
export * from './signature';
export * from './acts';
export { richOfField } from './text-fields';
