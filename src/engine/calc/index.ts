/* Calculation by JSON, for the command line, the endpoint, the method file and the reference tests. */
export { calculate, engineInputs, type CalcAnswer, type CalcRequest } from './calculate';
export { casesOf, workCase, type CaseError, type CaseResult } from './cases';
export { inUnit, readUnit } from './units';
export { type CalcValue } from './value';
