/* Which loads and sizes of the invented site this engine works by itself; the rest stand as external sheets. */
import { type Input } from '@domain/basis';
import { methodById } from '@engine/catalog';
import { type DemoAnswer, type DemoInput } from './demo-types';
import { inputOf } from './figures';
import { fluidId } from './fluids';
import { idOf } from './ids';
import { renamed } from './load-methods';

/** Methods for which the invented site's inputs suffice. */
const CARRIED = new Set([
  'a.gas',
  'b.steam',
  'c.liquid',
  'd.omega-saturated',
  'e.fire-unwetted',
  'e.fire-wetted',
  'f.blocked-outlet',
  'f.check-valve-reverse-flow',
  'f.compressor-rate',
  'f.control-valve-gas',
  'f.control-valve-liquid',
  'f.gas-blowby',
  'f.positive-displacement',
  'f.reaction-heat',
  'f.stated-rate',
  'f.thermal-expansion',
  'f.tube-rupture',
  'f.vaporisation',
  'i.iso4126-gas',
  'i.iso4126-liquid',
  'i.iso4126-steam',
  'k.out-breathing',
  'k.in-breathing',
  'k.emergency-venting',
  'k.blanket-regulator',
  'k.vent-area',
]);

/** True when the engine has the method and their inputs suffice for it. */
export function worksHere(method: string): boolean {
  return CARRIED.has(method) && methodById(method) !== undefined;
}

const VESSEL: Record<string, string> = {
  orientation: 'shape/orientation',
  D: 'shape/diameter',
  L: 'shape/length',
  heads: 'shape/heads',
  liquid_level: 'levels/fire',
  elevation_of_bottom: 'elevation',
};
const INSULATION: Record<string, string> = {
  insulation_conductivity: 'k_ins',
  insulation_thickness: 'thickness',
};

/** The n-th vessel's inputs, used from the document: bare names for the first, with _2, _3 … after it. */
function vesselInputs(tag: string, n: number, wetted: boolean): [string, Input][] {
  const suffix = n === 1 ? '' : `_${String(n)}`;
  const fields = Object.entries(VESSEL).filter(([name]) => wetted || name !== 'liquid_level');
  const used = fields.map(([name, path]): [string, Input] => [
    `${name}${suffix}`,
    { use: `equipment/${idOf('eq', tag)}/${path}` },
  ]);
  return [[`tag${suffix}`, { word: tag }], ...used];
}

function vesselsOf(input: DemoInput | undefined): string[] {
  return Array.isArray(input?.value) ? input.value : [];
}

/** Inputs of the pool fire: each vessel named, the allowance for piping, drainage, and insulation where it is credited. */
export function fireWettedInputs(answer: DemoAnswer): Record<string, Input> {
  const { vessels, ...others } = answer.load.inputs;
  const stated = Object.entries(others).map(([name, input]): [string, Input] => [
    INSULATION[name] ?? name,
    inputOf(input),
  ]);
  const insulated = 'insulation_conductivity' in others;
  const process: [string, Input][] = insulated
    ? [['T_process', { use: `fluids/${fluidId(answer.fluid)}/T` }]]
    : [];
  return Object.fromEntries([
    ...vesselsOf(vessels).flatMap((tag, n) => vesselInputs(tag, n + 1, true)),
    ...stated,
    ...process,
  ]);
}

/** Inputs of the fire on gas-filled vessels: each vessel named, then what the sheet states. */
export function fireUnwettedInputs(answer: DemoAnswer): Record<string, Input> {
  const { vessels, ...others } = answer.load.inputs;
  const stated = Object.entries(others).map(([name, input]): [string, Input] => [name, inputOf(input)]);
  return Object.fromEntries([
    ...vesselsOf(vessels).flatMap((tag, n) => vesselInputs(tag, n + 1, false)),
    ...Object.entries(renamed(answer.load.method, Object.fromEntries(stated))),
  ]);
}
