/* Parameters of fluids, fire and scenarios that enter results and outcomes: a signature binds them. */
import { parametersOf, type Parameter } from './parameter-row';

const PRACTICE = 'common practice, no source';
const MEMORY = 'API 520 / 521, from memory';

export const PROCESS_PARAMETERS: readonly Parameter[] = parametersOf('judgement', [
  // Fluids and methods
  [
    'statePressure',
    'pressure of a state may differ from relief by',
    'fraction',
    0.02,
    [0.005, 0.05],
    PRACTICE,
  ],
  ['stateTemperature', 'temperature of a state may differ from relief by', 'K', 5, [1, 10], PRACTICE],
  ['kWarnBelow', 'ratio of specific heats is doubted below', '', 1.05, [1.01, 1.1], PRACTICE],
  ['zLow', 'compressibility factor is doubted below', '', 0.8, [0.7, 0.9], MEMORY],
  ['zHigh', 'compressibility factor is doubted above', '', 1.1, [1.05, 1.2], MEMORY],
  ['densityBand', 'density may differ from PM/(ZRT) by', 'fraction', 0.03, [0.01, 0.05], PRACTICE],
  ['latentFloor', 'floor of the latent heat', 'kJ/kg', 115, [80, 150], MEMORY],

  // Fire
  ['fireHeight', 'height of a pool fire', 'm', 7.6, [7.6, 15], 'API 521 5th edition, 7.6 m (25 ft)'],
  ['dryOutTime', 'a wall dry sooner than this is looked at', 'min', 15, [10, 60], PRACTICE],
  ['fireZoneAreaMin', 'smallest usual fire zone', 'm²', 230, [150, 600], 'API 521, as quoted publicly'],
  ['fireZoneAreaMax', 'largest usual fire zone', 'm²', 460, [150, 600], 'API 521, as quoted publicly'],

  // Scenarios
  ['reasonLength', 'least length of a reason', 'characters', 40, [20, 120], PRACTICE],
  [
    'operatorTime',
    'least time for a person to act',
    'min',
    20,
    [10, 30],
    'API 521 5th edition, 10 to 30 min as quoted publicly',
  ],
  ['allowTripCredit', 'a trip may be credited', '', false, undefined, 'site'],
  ['seriesLeakDiameter', 'leak of check valves in series', 'of diameter', 0.1, [0.1, 0.33], MEMORY],
  ['bypassShare', 'share of the bypass that counts', '', 1, [0.5, 1], PRACTICE],
  ['blockedInVolume', 'blocked-in volume that needs no relief', 'm³', 0, [0, 1], PRACTICE],
  ['highSideBasis', 'pressure of the high side', '', 'design', ['design', 'max-operating'], 'API 521'],
  ['naturalDraught', 'duty left of an air cooler without fans', 'fraction', 0.2, [0, 0.3], 'from memory'],
  ['pastedSimilarity', 'reasons as alike as this count as pasted', '', 0.9, [0.8, 1], PRACTICE],
  [
    'engineShift',
    'a result that moves by more is a moved result',
    'fraction',
    0.005,
    [0.001, 0.02],
    PRACTICE,
  ],
  ['comparisonSlack', 'slack of comparisons', 'fraction', 0.001, [0.001, 0.001], 'unit rounding'],
  ['unseenFactor', 'tolerances of the unseen check times', '', 1, [0.1, 2], PRACTICE],
  ['lengthBand', 'length found may exceed the calculated one by', 'fraction', 0.1, [0, 0.2], PRACTICE],
]);
