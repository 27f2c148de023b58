/* A composition in words, such as "propane 0.6; n-butane 0.4" (mole fractions), read into substances and fractions. */
import { findSubstance, similarNames } from './library';
import { type Substance } from './substances/types';

/** Substances with mole fractions that sum to 1. */
export type Composition = { substances: readonly Substance[]; z: readonly number[] };

/** A composition, or a sentence on what is wrong with the words. */
export type CompositionRead =
  { ok: true; composition: Composition; note?: string } | { ok: false; text: string };

/** The most substances a composition may hold. */
export const MAX_COMPONENTS = 20;

/** How far a sum of fractions may be from 1 (or 100 %) to be taken as rounding and scaled. */
const SUM_TOLERANCE = 0.02;

type Part = { name: string; amount?: number; percent: boolean };

const NUMBER = /^(.+?)[\s=:]+([+-]?(?:\d+\.?\d*|\.\d+)(?:[eE][+-]?\d+)?)\s*(%)?$/;

function readPart(text: string): Part {
  const found = NUMBER.exec(text);
  const [, name, amount, percent] = found ?? [];
  // "1-butene" and "R-22" end in no amount: the whole part is a name then.
  if (name === undefined || amount === undefined || findSubstance(text) !== undefined)
    return { name: text, percent: false };
  return { name: name.trim(), amount: Number(amount), percent: percent !== undefined };
}

const refuse = (text: string): CompositionRead => ({ ok: false, text });

function unknown(name: string): CompositionRead {
  const near = similarNames(name);
  const hint = near.length > 0 ? ` Perhaps: ${near.join(', ')}.` : '';
  return refuse(
    `"${name}" is not a substance of the library.${hint} Write the name of the library, or give your own figures instead.`,
  );
}

/** What is wrong with the amounts, or undefined. */
function amountsWrong(parts: readonly Part[]): string | undefined {
  const missing = parts.find((p) => p.amount === undefined);
  if (missing)
    return `"${missing.name}" has no mole fraction; write it behind the name, as in "propane 0.6".`;
  const bad = parts.find((p) => !((p.amount ?? 0) > 0));
  if (bad)
    return `The mole fraction of "${bad.name}" is ${bad.amount}; it must be above 0. Leave out what is not there.`;
  if (parts.some((p) => p.percent) && !parts.every((p) => p.percent))
    return 'Mole fractions and mole per cent are mixed; write all with % or none.';
  return undefined;
}

function fractions(parts: readonly Part[]): number[] | string {
  const scale = parts[0]?.percent ? 100 : 1;
  const values = parts.map((p) => (p.amount ?? 0) / scale);
  const sum = values.reduce((a, b) => a + b, 0);
  if (!(Math.abs(sum - 1) <= SUM_TOLERANCE))
    return `The mole fractions sum to ${Number(sum.toPrecision(4))}; they must sum to 1 (or to 100 with %).`;
  return values.map((v) => v / sum);
}

/**
 * Reads a composition: parts between semicolons, each a name and a mole fraction (`propane 0.6`) or mole per cent
 * (`propane 60 %`); a single name is the pure substance. Fractions that miss a sum of 1 by 0.02 at most are scaled, and
 * the note says so.
 */
export function readComposition(words: string): CompositionRead {
  const parts = words
    .split(/[;\n]/)
    .map((p) => p.trim())
    .filter((p) => p !== '')
    .map(readPart);
  if (parts.length === 0)
    return refuse('The composition is empty; write, for example, "propane 0.6; n-butane 0.4".');
  if (parts.length > MAX_COMPONENTS)
    return refuse(
      `The composition has ${parts.length} substances; at most ${MAX_COMPONENTS} are worked. Lump the heaviest ones.`,
    );
  const found: Substance[] = [];
  for (const { name } of parts) {
    const substance = findSubstance(name);
    if (substance === undefined) return unknown(name);
    if (found.includes(substance))
      return refuse(`${substance.name} stands twice in the composition; add its fractions.`);
    found.push(substance);
  }
  if (parts.length === 1 && parts[0]?.amount === undefined)
    return { ok: true, composition: { substances: found, z: [1] } };
  const wrong = amountsWrong(parts);
  if (wrong !== undefined) return refuse(wrong);
  const z = fractions(parts);
  if (typeof z === 'string') return refuse(z);
  const scaled = z.some(
    (v, i) => Math.abs(v - (parts[i]?.amount ?? 0) / (parts[i]?.percent ? 100 : 1)) > 1e-12,
  );
  const composition = { substances: found, z };
  return scaled
    ? { ok: true, composition, note: 'The mole fractions did not sum to 1 and were scaled.' }
    : { ok: true, composition };
}
