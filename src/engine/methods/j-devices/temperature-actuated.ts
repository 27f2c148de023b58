/* Method j.temperature-actuated: a temperature (and pressure) relief valve on hot water, against the heat put in. */
import { type Method } from '../../catalog/types';
import { type SheetBuilder, workSheet } from '../../sheet';
import { input, optional, output } from '../common/describe';
import { SYSTEM_UNITS, type System, systemOf } from '../common/system';

const CLAUSE = 'ANSI Z21.22 / CSA 4.4, temperature and pressure relief valves';
const READING: Record<System, string> = { SI: 'degC', US: 'degF' };

/** Highest temperature at which such a valve may be set, 99 °C (210 °F; ANSI Z21.22, from memory), by system. */
export const HIGHEST_OPENING: Record<System, number> = { SI: 98.9, US: 210 };

/** Lowest part of the storage within which the element must sit, m from the top (6 in; ANSI Z21.22, from memory). */
export const ELEMENT_WITHIN = 0.1524;

/** Whether the element feels the water that gets hot: immersed, and near enough to the top. */
function elementStep(sheet: SheetBuilder): boolean {
  const immersed = sheet.flag('element_in_water', false);
  const depth = sheet.has('element_depth') ? sheet.number('element_depth', 'm', { min: 0 }, 'z') : undefined;
  if (!immersed)
    sheet.warn(
      'ELEMENT_DRY',
      'The element is not said to sit in the water: the valve then opens by pressure alone.',
    );
  if (depth === undefined || depth <= ELEMENT_WITHIN + 1e-6) return immersed;
  sheet.warn(
    'ELEMENT_TOO_LOW',
    'The element sits more than 150 mm (6 in) below the top of the storage, where the hottest water does not reach it.',
  );
  return false;
}

/** Opening temperature not above the limit, nor above that of boiling where it is given. */
function openingStep(sheet: SheetBuilder, system: System): boolean {
  const opens = sheet.number('opens_at', READING[system], {}, 't_o');
  const limit = HIGHEST_OPENING[system];
  const boiling = sheet.has('boiling_temperature')
    ? sheet.number('boiling_temperature', READING[system], {}, 't_b')
    : undefined;
  const least = boiling === undefined ? limit : Math.min(limit, boiling);
  const low = opens <= least + 0.05;
  if (!low)
    sheet.warn(
      'OPENS_TOO_HOT',
      `The valve opens above ${boiling !== undefined && boiling < limit ? 'the boiling temperature at the site' : '99 °C (210 °F)'}: the water can flash before it opens.`,
    );
  return low;
}

/** j.temperature-actuated: reliance on a temperature-actuated relief valve. */
export const TEMPERATURE_ACTUATED: Method = {
  id: 'j.temperature-actuated',
  version: 1,
  topic: 'j.temperature-actuated',
  title: 'Temperature-actuated relief valve: rating against the heat put in',
  editions: ['ANSI Z21.22 / CSA 4.4'],
  source:
    'ANSI Z21.22 / CSA 4.4, temperature steam rating in heat an hour, opening at 99 °C (210 °F), element in the top 150 mm (6 in); from memory',
  validity:
    'Hot-water storage heated by a source of known heat; rating of the temperature element as tested. The valve answers hot water; pressure causes are sized on its pressure side.',
  inputs: [
    input('heat_input', 'greatest heat that can be put into the water', 'power', { rangeKey: 'heatInput' }),
    input('temperature_rating', 'temperature rating on the nameplate', 'power', { rangeKey: 'heatInput' }),
    input('opens_at', 'temperature at which the element opens fully', 'temperature'),
    optional(
      'boiling_temperature',
      'boiling temperature of the water at the site and pressure',
      'temperature',
    ),
    optional('element_in_water', 'whether the element sits in the water (no when not given)'),
    optional('element_depth', 'depth of the element below the top of the storage', 'length'),
  ],
  outputs: [
    output('use', 'heat put in over the rating', 'dimensionless'),
    output('rating_suffices', 'whether the rating covers the heat'),
    output('relied_on', 'whether the temperature element may be relied on'),
  ],
  work(inputs, edition) {
    return workSheet(this, inputs, edition, (sheet) => {
      const system = systemOf(inputs, ['heat_input', 'temperature_rating']);
      const { heat } = SYSTEM_UNITS[system];
      const put = sheet.number('heat_input', heat, { min: 0 }, 'Q');
      const rating = sheet.number('temperature_rating', heat, { above: 0 }, 'Q_r');
      const use = sheet.step(
        {
          key: 'u',
          meaning: 'share of the rating that the heat uses',
          value: put / rating,
          unit: '-',
          clause: CLAUSE,
          memory: true,
        },
        (v) => `\\frac{${v('heat_input')}}{${v('temperature_rating')}}`,
      );
      const suffices = use <= 1;
      if (!suffices)
        sheet.warn('RATING_TOO_SMALL', 'The heat put in is more than the temperature rating of the valve.');
      const felt = elementStep(sheet);
      const low = openingStep(sheet, system);
      sheet.output('use', use);
      sheet.output('rating_suffices', suffices);
      const relied = suffices && felt && low;
      sheet.output('relied_on', relied);
      sheet.say({
        symbol: '\\text{reliance}',
        meaning: relied
          ? 'the temperature element may be relied on'
          : 'the temperature element is not relied on; see the warnings',
        value: relied ? 'yes' : 'no',
        tex: '\\text{rating, element in the water, opening temperature}',
        clause: CLAUSE,
      });
    });
  },
};
