/* The 35 standard causes of overpressure and vacuum, in standard order; a site may add some and never removes one. */
import { UTILITY_SCENARIOS } from './cooling-and-heat';
import { EQUIPMENT_SCENARIOS } from './equipment-and-fire';
import { PROCESS_SCENARIOS } from './outlets-and-inlets';
import { type LoadWays, LOAD_WAYS } from './load-ways';
import { type StandardScenario, type WrittenScenario } from './standard';
import { SERVICE_SCENARIOS } from './tanks-and-service';

/** Every standard scenario says how its load is found; a missing entry is a fault of the list itself. */
function loadWaysOf(key: string): LoadWays {
  const ways = LOAD_WAYS[key];
  if (!ways) throw new Error(`The standard scenario ${key} does not say how its load is found`);
  return ways;
}

const WRITTEN: readonly WrittenScenario[] = [
  ...PROCESS_SCENARIOS,
  ...UTILITY_SCENARIOS,
  ...EQUIPMENT_SCENARIOS,
  ...SERVICE_SCENARIOS,
];

export const SCENARIOS: readonly StandardScenario[] = WRITTEN.map((scenario) => ({
  ...scenario,
  load: loadWaysOf(scenario.key),
}));

const BY_KEY = new Map(SCENARIOS.map((scenario, order) => [scenario.key, { scenario, order }]));

/** The standard scenario of a key or of a scenario's id (`key~2` is a second instance); nothing for one of the site's own. */
export function scenarioByKey(keyOrId: string): StandardScenario | undefined {
  return BY_KEY.get(keyOrId.split('~')[0] ?? keyOrId)?.scenario;
}

/** Its place in the standard list, for sorting; the site's own come after all standard ones. */
export function orderOfScenario(keyOrId: string): number {
  return BY_KEY.get(keyOrId.split('~')[0] ?? keyOrId)?.order ?? SCENARIOS.length;
}

/** Every {placeholder} that is still in a sentence. */
export function placeholdersIn(text: string): string[] {
  return [...text.matchAll(/\{[^{}]+\}/g)].map(([placeholder]) => placeholder);
}

/** The starting sentences of a scenario for one disposition. */
export function sentencesFor(keyOrId: string, disposition: string): string[] {
  const scenario = scenarioByKey(keyOrId);
  return (scenario?.sentences ?? []).filter((one) => one.disposition === disposition).map((one) => one.text);
}

/** The standard scenarios whose load a method serves, in standard order; the id with or without its version. */
export function scenariosServedBy(method: string): readonly StandardScenario[] {
  const id = method.split('@')[0] ?? method;
  return SCENARIOS.filter((scenario) => scenario.load.methods.some((one) => one === id));
}
