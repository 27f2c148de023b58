/* Answers of credible scenarios: loads and sizes by a method of ours, as stated, or by an external sheet with the stored figures. */
import { type Answer, type Calc, type ExternalSheet, type Input } from '@domain/basis';
import {
  type DemoAnswer,
  type DemoAnswerResult,
  type DemoInput,
  type DemoSheet,
  type DemoSystem,
} from './demo-types';
import { externalSheet } from './external';
import { linked, linksOf } from './feeds';
import { inputOf } from './figures';
import { fluidId } from './fluids';
import { groupId } from './groups';
import { idOf } from './ids';
import { LOAD_METHODS, renamed } from './load-methods';
import { fireUnwettedInputs, fireWettedInputs, worksHere } from './methods';
import { TANK_METHODS, tankInputs } from './tanks';

/** An answer with the external sheets that it rests on. */
export type Answered = { answer: Answer; sheets: ExternalSheet[] };
/** What is needed beside the answer itself: where it stands and its stored results. */
export type AnswerContext = {
  system: DemoSystem;
  scenario: string;
  result: DemoAnswerResult | undefined;
  study: string;
};

const ACCUMULATIONS: Record<string, Answer['accumulation']> = {
  single: 'single',
  multiple: 'several',
  fire: 'fire',
  tank: 'tank',
  'tank-vacuum': 'tank-vacuum',
};

/** The id of the answer of a group inside its scenario. */
export const answerId = (group: string): string => idOf('ans', group);

/** Inputs of a sheet of theirs; those that a source of the document carries are used from there. */
export function inputsOf(sheet: DemoSheet, system: DemoSystem): Record<string, Input> {
  const links = linksOf(system);
  return Object.fromEntries(
    Object.entries(sheet.inputs).map(([name, input]) => [
      name,
      linked(links, name, input) ?? fluidOr(name, input),
    ]),
  );
}

function fluidOr(name: string, input: DemoInput): Input {
  const other = name === 'upstream_fluid' || name === 'high_side_fluid';
  return other && typeof input.value === 'string' ? { list: [fluidId(input.value)] } : inputOf(input);
}

function methodInputs(answer: DemoAnswer, system: DemoSystem): Record<string, Input> {
  if (answer.load.method === 'e.fire-wetted') return fireWettedInputs(answer);
  if (answer.load.method === 'e.fire-unwetted') return fireUnwettedInputs(answer);
  const inputs = inputsOf(answer.load, system);
  if (answer.load.method in TANK_METHODS) return tankInputs(answer.load, inputs, system);
  return renamed(answer.load.method, inputs);
}

function loadOf(answer: DemoAnswer, context: AnswerContext): { calc: Calc; sheet?: ExternalSheet } {
  const theirs = answer.load.method;
  const method = LOAD_METHODS[theirs] ?? TANK_METHODS[theirs] ?? theirs;
  if (worksHere(method))
    return { calc: { by: 'method', method, inputs: methodInputs(answer, context.system) } };
  const sheet = externalSheet({
    about: 'load',
    scenario: context.scenario,
    group: answer.group,
    method: theirs,
    inputs: inputsOf(answer.load, context.system),
    result: context.result,
    study: context.study,
  });
  return { calc: { by: 'external', sheet: sheet.id }, sheet };
}

/** Entered coefficients; an area of ISO 4126-1 or of an unwetted fire takes the certified one of the devices where it is theirs. */
function sizeInputs({ sizing }: DemoAnswer, system: DemoSystem): Record<string, Input> {
  const { Kd, KSH } = sizing.inputs;
  const certified = system.devices.some((device) => device.K_certified?.value === Kd?.value);
  const actual = sizing.method.startsWith('i.') && !certified ? { Kdr: Kd } : {};
  const coefficient = /^[ei]\./.test(sizing.method) ? actual : { Kd };
  const known = Object.entries({ ...coefficient, KSH }).flatMap(([name, input]) =>
    input ? [[name, inputOf(input)]] : [],
  );
  return Object.fromEntries(known) as Record<string, Input>;
}

function sizeOf(answer: DemoAnswer, context: AnswerContext): { calc: Calc; sheet?: ExternalSheet } {
  const { method: theirs, inputs } = answer.sizing;
  const method = TANK_METHODS[theirs] ?? theirs;
  if (worksHere(method)) {
    const formula = inputs['Kv_formula'];
    const edition = formula === undefined ? {} : { edition: String(formula.value) };
    return { calc: { by: 'method', method, ...edition, inputs: sizeInputs(answer, context.system) } };
  }
  const sheet = externalSheet({
    about: 'size',
    scenario: context.scenario,
    group: answer.group,
    method: theirs,
    inputs: inputsOf(answer.sizing, context.system),
    result: context.result,
    study: context.study,
  });
  return { calc: { by: 'external', sheet: sheet.id }, sheet };
}

/** One answer with its external sheets. */
export function answerOf(answer: DemoAnswer, context: AnswerContext): Answered {
  const load = loadOf(answer, context);
  const size = sizeOf(answer, context);
  const fluid = context.system.fluids.find((candidate) => candidate.id === answer.fluid);
  return {
    sheets: [load.sheet, size.sheet].flatMap((sheet) => sheet ?? []),
    answer: {
      id: answerId(answer.group),
      fluid: fluidId(answer.fluid),
      group: groupId(answer.group),
      liquidFull: fluid?.phase === 'liquid',
      load: load.calc,
      size: size.calc,
      accumulation: ACCUMULATIONS[answer.accumulation] ?? 'single',
    },
  };
}
