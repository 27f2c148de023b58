/* The public face of the standard scenarios. */
export * from './list';
export { type StandardScenario, type StartingSentence } from './standard';
