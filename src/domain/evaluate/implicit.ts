/* Inputs that need not be entered: taken from the limit sheet, the load sheet, the fluid, the group and its relief points. */
import { type Fluid, type Path, getAt, isFigure, quantityOf } from '@domain/basis';
import { methodById } from '@engine/catalog';
import { fromSI, toSI } from '@engine/quantity';
import { type Found, type Resolved } from './inputs';
import { type Made, outputOf } from './sheets';
import { type CredibleAnswer, type Work } from './work';

/** Value and origin of an input by its name in the method; worked only when the method asks for it. */
export type Values = Record<string, () => Found | undefined>;

/** Adds what is known to the entered inputs, for the inputs that the method names and nobody entered. */
export function fillImplicit(method: string, resolved: Resolved, values: Values): Made {
  const made: Made = { inputs: { ...resolved.inputs }, from: { ...resolved.from } };
  const missing = new Set(resolved.missing.map((item) => item.name));
  for (const input of methodById(method)?.inputs ?? []) {
    // What is given for each part of a series belongs to that part: nothing else may stand in for it.
    if (input.each !== undefined) continue;
    if (input.name in made.inputs || missing.has(input.name)) continue;
    const found = values[input.name]?.();
    if (!found) continue;
    made.inputs[input.name] = found.value;
    made.from[input.name] = found.path;
  }
  return made;
}

/** The fluid of an answer. */
export function fluidOf(work: Work, ca: CredibleAnswer): Fluid | undefined {
  return ca.answer.fluid === undefined ? undefined : work.lookup.fluids.get(ca.answer.fluid);
}

function figureOf(work: Work, path: Path): Found | undefined {
  const found = getAt(work.basis, path);
  if (typeof found === 'string' || typeof found === 'boolean') return { value: found, path };
  const q = isFigure(found) ? quantityOf(found) : undefined;
  return q && { value: q, path };
}

function isLiquid(fluid: Fluid): boolean {
  return fluid.phase === 'liquid' || fluid.phase === 'flashing-liquid';
}

/** The vapour pressure that was entered first. */
function vapourPressure(work: Work, fluid: Fluid): Found | undefined {
  const first = fluid.psat?.[0];
  return first && figureOf(work, `fluids/${fluid.id}/psat/${first.id}/p`);
}

/** The specific volume of a vapour as the reciprocal of its density. */
function vapourVolume(fluid: Fluid): Found | undefined {
  const rho = quantityOf(fluid.rhoVapour);
  if (!rho || !(rho.value > 0)) return undefined;
  return { value: fromSI(1 / toSI(rho), 'm3/kg'), path: `fluids/${fluid.id}/rhoVapour` };
}

/** The properties of a fluid by the names that methods use. */
export function fluidValues(work: Work, fluid: Fluid | undefined): Values {
  if (!fluid) return {};
  const at = (field: keyof Fluid) => () => figureOf(work, `fluids/${fluid.id}/${field}`);
  const liquid = isLiquid(fluid);
  return {
    T: at('T'),
    T0: at('T'),
    M: at('M'),
    Z: at('Z'),
    k: at('k'),
    n: at('n'),
    latent_heat: at('latentHeat'),
    cp: at('cpLiquid'),
    expansion_coefficient: at('expansion'),
    rho: at(liquid ? 'rhoLiquid' : 'rhoVapour'),
    rho0: at('rhoLiquid'),
    mu: at(liquid ? 'muLiquid' : 'muVapour'),
    v0: at('v0'),
    v9: at('v9'),
    G: at('relativeDensity'),
    compressibility: at('compressibility'),
    Pc: at('Pc'),
    Pv: () => vapourPressure(work, fluid),
    v: () => vapourVolume(fluid),
  };
}

/** The fluid in the words of the engine's library, where the document says what it is made of (by mole). */
function wordsOf({ id, from }: Fluid): Found | undefined {
  const path = `fluids/${id}/from`;
  if (from.kind === 'water') return { value: 'water', path };
  if (from.kind === 'substance' && from.substance !== undefined) return { value: from.substance, path };
  if (from.kind !== 'composition' || from.per === 'mass') return undefined;
  const parts = (from.parts ?? []).map(({ substance, amount }) => {
    const q = quantityOf(amount);
    return q && `${substance} ${String(toSI(q))}`;
  });
  return parts.length > 0 && parts.every(Boolean) ? { value: parts.join('; '), path } : undefined;
}

/** What only the two-phase methods ask of a fluid, under their names: what it is made of, quality, saturation, critical point. */
export function twoPhaseValues(work: Work, fluid: Fluid | undefined): Values {
  if (!fluid) return {};
  const at = (field: keyof Fluid) => () => figureOf(work, `fluids/${fluid.id}/${field}`);
  return {
    fluid: () => wordsOf(fluid),
    x0: at('quality'),
    omega: at('omega'),
    Ps: () => vapourPressure(work, fluid),
    Tc: at('Tc'),
    boiling_range: at('boilingRange'),
  };
}

/** What a limit sheet found, under the names that methods use. */
export function limitValues(work: Work, ca: CredibleAnswer): Values {
  const key = `limit:${ca.id}`;
  const output = (name: string) => (): Found | undefined => {
    const q = outputOf(work.sheets[key], name);
    return q && { value: q, path: `sheets/${key}#${name}` };
  };
  return {
    set_pressure: output('set_pressure'),
    overpressure: output('overpressure'),
    atmospheric_pressure: () => ({ value: work.context.barometer, path: 'site/barometer' }),
    MAWP: output('MAWP'),
    relieving_pressure: output('P1'),
  };
}

/** The fluid on the other side, where a load names it; its density counts only when it comes in as a liquid. */
function otherSide(work: Work, resolved: Resolved): Values {
  const id = resolved.lists['upstream_fluid']?.[0] ?? resolved.lists['high_side_fluid']?.[0];
  const other = id === undefined ? undefined : work.lookup.fluids.get(id);
  const values = fluidValues(work, other);
  if (other && !isLiquid(other)) delete values['rho'];
  return values;
}

/** Inputs of load methods: fluid, limits, and the relieving pressure as the low side of what flows in. */
export function loadValues(work: Work, ca: CredibleAnswer, resolved: Resolved): Values {
  const fluid = fluidOf(work, ca);
  const p1 = () => {
    const q = outputOf(work.sheets[`limit:${ca.id}`], 'P1');
    return q && { value: q, path: `sheets/limit:${ca.id}#P1` };
  };
  const sink: Values =
    ('UA' in resolved.inputs || 'T_hot_in' in resolved.inputs) && fluid
      ? { T_sink: () => figureOf(work, `fluids/${fluid.id}/T`) }
      : {};
  return {
    ...fluidValues(work, fluid),
    ...otherSide(work, resolved),
    ...limitValues(work, ca),
    ...sink,
    P2: p1,
    P_low: p1,
  };
}
