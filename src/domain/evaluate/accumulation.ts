/* How far a pressure may accumulate, by code basis and class of scenario, with the sentence of the sheet. */
import { type Answer, type Code } from '@domain/basis';
import { type JudgementRules } from '@domain/rules';
import { type LimitClass, limitTerms } from '@engine/methods/h-limits';
import { convert, type Q, toSI } from '@engine/quantity';
import { texNumber } from '@engine/sheet';

export type AccumulationClass = Exclude<Answer['accumulation'], 'tank' | 'tank-vacuum' | 'corrected-test'>;
export type Accumulated = { pa: number; tex: string; worked: string; clause: string };

/** ASME VIII-1 UG-125(c)(3): storage of liquefied gas in fire, 120 % (from memory). */
const STORAGE_FACTOR = 1.2;
const CLASSES: Record<AccumulationClass, LimitClass> = {
  single: 'single',
  several: 'multiple',
  fire: 'fire',
  'storage-fire': 'fire',
};
const FLOOR_UNIT = { US: 'psi', SI: 'kPa' } as const;
const CLAUSES: Partial<Record<Code['basis'], string>> = {
  en: 'PED 2014/68/EU Annex I 7.3',
  'asme-i': 'ASME I PG-67',
};

/** The site's limit for fire under EN, 110 % of PS unless its rules say more. */
export function enFireLimit(rules: JudgementRules): number {
  const value = rules.parameters['enFireLimit'];
  return typeof value === 'number' ? value : 1.1;
}

/**
 * The pressure to which `q` (MAWP or set pressure, gauge) may accumulate, Pa gauge, by the terms of the engine: ASME VIII-1
 * UG-125(c) with the floors of the code's own units, PED Annex I 7.3 for EN, ASME I; storage in fire 120 %.
 */
export function accumulated(q: Q, code: Code, kind: AccumulationClass, rules: JudgementRules): Accumulated {
  const options = { basis: code.basis, units: code.units, enFireLimit: enFireLimit(rules) };
  const terms = limitTerms(CLASSES[kind], options);
  const factor = kind === 'storage-fire' && code.basis !== 'en' ? STORAGE_FACTOR : terms.factor;
  const floor = { value: terms.floor, unit: FLOOR_UNIT[code.units] };
  const gauge = convert(q, 'Pa_g', { barometer: rules.barometer });
  const pa = Math.max(factor * gauge, gauge + toSI(floor));
  const clause = CLAUSES[code.basis] ?? 'ASME VIII-1 UG-125(c)';
  return { pa, ...written(q, factor, floor), clause };
}

function written(q: Q, factor: number, floor: Q): { tex: string; worked: string } {
  const [f, p] = [texNumber(factor), texNumber(q.value)];
  if (floor.value === 0) return { tex: `${f} \\cdot p`, worked: `${f} \\cdot ${p}` };
  const inUnit = toSI(floor) / (toSI({ value: 1, unit: q.unit }) - toSI({ value: 0, unit: q.unit }));
  const shown = texNumber(Number(inUnit.toPrecision(5)));
  const kPa = texNumber(Number(convert(floor, 'kPa').toPrecision(4)));
  return {
    tex: `\\max(${f} \\cdot p,\\ p + ${kPa}\\,\\text{kPa})`,
    worked: `\\max(${f} \\cdot ${p},\\ ${p} + ${shown})`,
  };
}
