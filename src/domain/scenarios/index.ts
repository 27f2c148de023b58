/* The public face of the standard scenarios. */
export * from './list';
export { type LoadWays } from './load-ways';
export { type StandardScenario, type StartingSentence } from './standard';
