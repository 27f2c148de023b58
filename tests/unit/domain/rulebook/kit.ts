/* Trying a rule: a change of the small basis on which it must speak, and one near the limit on which it must not. */
import { describe, expect, it } from 'vitest';
import { type Basis, type ReliefPoint, type Scenario } from '@domain/basis';
import { type Outcome, ruleOf } from '@domain/rulebook';
import { type JudgementRules } from '@domain/rules';
import { basisWith, first, outcomesOf, smallBasis, valve } from '../../../fixtures/basis';

export type Change = (basis: Basis) => void;

/** One trial. `source` says where the numbers are from; `says` is a part of the sentence; `changed` judges beside the small basis in force. */
export type Trial = {
  code: string;
  source: string;
  fires: Change;
  says?: string;
  severity?: Outcome['severity'];
  quiet?: Change;
  changed?: true;
  rules?: Partial<JudgementRules>;
  both?: Change;
};

function outcomes(trial: Trial, change: Change): Outcome[] {
  const basis = basisWith((one) => {
    trial.both?.(one);
    change(one);
  });
  const prior = trial.changed ? basisWith((one) => trial.both?.(one)) : undefined;
  const options = { ...(prior ? { prior } : {}), ...(trial.rules ? { rules: trial.rules } : {}) };
  return outcomesOf(basis, options).filter((outcome) => outcome.code === trial.code);
}

/** Tries rules: each must fire on its change and be silent beside it. */
export function tryRules(title: string, trials: readonly Trial[]): void {
  describe(title, () => {
    it.each(trials)('$code fires ($source)', (trial) => {
      const [outcome] = outcomes(trial, trial.fires);
      expect(outcome?.sentence).toContain(trial.says ?? '');
      expect(outcome?.sentence).not.toMatch(/[{}—]/);
      expect(outcome?.severity).toBe(trial.severity ?? ruleOf(trial.code)?.severity);
      expect(outcome?.where).toMatch(/^(changes|scenarios|lines|sheets)(#|\/|$)/);
    });
    it.each(trials)('$code is silent within its limit', (trial) => {
      expect(outcomes(trial, trial.quiet ?? (() => undefined)).map((outcome) => outcome.sentence)).toEqual(
        [],
      );
    });
  });
}

export const q = (value: number, unit: string) => ({ value, unit });
export const equipment = (basis: Basis) => first(basis.equipment);
export const side = (basis: Basis) => first(equipment(basis).sides);
export const point = (basis: Basis) => first(basis.reliefPoints);
export const fluid = (basis: Basis) => first(basis.fluids);
export const group = (basis: Basis) => first(basis.groups);

export function scenario(basis: Basis, key: string): Scenario {
  const found = basis.scenarios.find((one) => one.key === key);
  if (!found) throw new Error(`no scenario ${key}`);
  return found;
}

export const heat = (basis: Basis) => scenario(basis, 'abnormal-heat-input');
export const fire = (basis: Basis) => scenario(basis, 'fire-wetted');
export const heatAnswer = (basis: Basis) => first(heat(basis).answers);
export const fireAnswer = (basis: Basis) => first(fire(basis).answers);

/** Sets the set pressure of the first valve, bar gauge. */
export const set = (value: number) => (basis: Basis) => void (point(basis).set = q(value, 'bar_g'));

/** Adds a second valve like the first. */
export function second(
  basis: Basis,
  change: Partial<ReliefPoint> = {},
  place: 'additional' | 'supplementary-fire' | 'spare' = 'additional',
): ReliefPoint {
  const added: ReliefPoint = { ...valve(), id: 'rp_2', tag: 'PSV-2', ...change };
  basis.reliefPoints.push(added);
  group(basis).members.push({ id: 'mb_2', point: 'rp_2', credited: true, place });
  return added;
}

/** An external sheet about the first valve. */
export function lineSheet(
  basis: Basis,
  about: 'inlet' | 'outlet',
  figures: Record<string, { value: number; unit: string }>,
): void {
  basis.externalSheets.push({
    id: `xs_${about}`,
    about,
    title: 'Line',
    author: 'A. Person',
    method: 'g',
    inputs: { point: { list: ['rp_1'] } },
    figures,
  });
}

export { basisWith, first, outcomesOf, smallBasis };
