/* The standard list of scenarios. */
import { describe, expect, it } from 'vitest';
import { EQUIPMENT_KINDS } from '@domain/basis';
import { orderOfScenario, placeholdersIn, scenarioByKey, SCENARIOS, sentencesFor } from '@domain/scenarios';

describe('SCENARIOS', () => {
  it('are 35 with keys of their own, a question, kinds and statuses', () => {
    expect(SCENARIOS).toHaveLength(35);
    expect(new Set(SCENARIOS.map(({ key }) => key)).size).toBe(35);
    for (const scenario of SCENARIOS) {
      expect(scenario.question).toMatch(/\?$|beyond what still leaves\?$/);
      expect(scenario.kinds.length).toBeGreaterThan(0);
      expect(scenario.statuses.length).toBeGreaterThan(0);
      expect(scenario.sentences.length).toBeGreaterThan(0);
    }
  });

  it('ask something of every kind of equipment', () => {
    for (const kind of EQUIPMENT_KINDS)
      expect(SCENARIOS.some(({ kinds }) => kinds.includes(kind))).toBe(true);
  });

  it('offer whole sentences with balanced placeholders', () => {
    for (const { text } of SCENARIOS.flatMap(({ sentences }) => sentences)) {
      expect(text).toMatch(/^[A-Z{].+\.$/);
      expect(text.replace(/\{[^{}]+\}/g, '')).not.toMatch(/[{}“”[\]*]/);
    }
  });

  it('hold fire to the fire limit and leave out accumulation where relief is no answer', () => {
    expect(scenarioByKey('fire-wetted')).toMatchObject({
      accumulation: 'fire',
      headerCommon: 'yes',
      utility: 'fire-zone',
    });
    expect(scenarioByKey('closed-outlet')).toMatchObject({ accumulation: 'single', headerCommon: 'no' });
    expect(scenarioByKey('vacuum')?.accumulation).toBe('tank-vacuum');
    expect(scenarioByKey('internal-deflagration')?.accumulation).toBeUndefined();
  });

  it('are found by key and by the id of a second instance, in standard order', () => {
    expect(scenarioByKey('tube-rupture~2')?.key).toBe('tube-rupture');
    expect(scenarioByKey('site-own')).toBeUndefined();
    expect(orderOfScenario('closed-outlet')).toBe(0);
    expect(orderOfScenario('isolated-equipment-heating')).toBe(34);
    expect(orderOfScenario('site-own')).toBe(35);
  });

  it('offer sentences by disposition', () => {
    expect(sentencesFor('cooling-water-loss', 'not-applicable')).toEqual([
      '{equipment} has no water-cooled duty.',
    ]);
    expect(placeholdersIn('With {a} and {b c}.')).toEqual(['{a}', '{b c}']);
  });
});
