/* Credits that lower the heat of a pool fire: insulation, cover, drainage with fire fighting. */
import { type MethodInput } from '../../catalog/types';
import { type SheetBuilder } from '../../sheet';
import { optional } from '../common/describe';
import { insulationStep } from './insulation';

/**
 * Environment factor by the kind of installation (API 521, table of environment factors, from memory). Water spray gives
 * no credit, because it is not proof against wind, heat or a want of water.
 */
export const PROTECTIONS: Readonly<Record<string, number>> = {
  bare: 1,
  'water-spray': 1,
  'earth-covered': 0.03,
  underground: 0,
};

/** The words of the protections. */
export const PROTECTION_WORDS = ['bare', 'water-spray', 'earth-covered', 'underground'] as const;

/** Inputs of the credits, alike for every pool fire. */
export const FIRE_CREDIT_INPUTS: readonly MethodInput[] = [
  optional(
    'F',
    'environment factor (1 when neither F, nor protection, nor insulation is given)',
    'dimensionless',
    {
      rangeKey: 'environmentFactor',
    },
  ),
  optional('protection', 'kind of installation, in place of F', undefined, { words: [...PROTECTION_WORDS] }),
  optional('k_ins', 'conductivity of the insulation', 'heat-conductivity', {
    rangeKey: 'insulationConductivity',
  }),
  optional('thickness', 'thickness of the insulation', 'length', { rangeKey: 'insulationThickness' }),
  optional('T_process', 'process temperature at relief', 'temperature', { rangeKey: 'relievingTemperature' }),
  optional(
    'adequate_drainage',
    'whether drainage and fire fighting are adequate (yes, with a warning, when not given)',
  ),
];

/** F by the kind of installation. */
function protectionStep(sheet: SheetBuilder): number {
  const word = sheet.word('protection', PROTECTION_WORDS);
  if (word === 'water-spray')
    sheet.warn('SPRAY_NO_CREDIT', 'Water spray lowers no environment factor: F stays 1 for the load.');
  const F = PROTECTIONS[word] ?? 1;
  sheet.say({
    symbol: 'F',
    meaning: `environment factor of a ${word.replace('-', ' ')} vessel`,
    value: String(F),
    tex: `F = ${F}`,
    clause: 'API 521, environment factors (from memory)',
  });
  return sheet.keep('F', F, 'F');
}

/** The environment factor: as given, by the kind of installation, from insulation, or 1; gives the output `F`. */
export function fireFactor(sheet: SheetBuilder): number {
  const F = factorOf(sheet);
  sheet.output('F', F);
  return F;
}

function factorOf(sheet: SheetBuilder): number {
  if (sheet.has('F')) return sheet.number('F', '-', { min: 0, max: 1 });
  if (sheet.has('k_ins')) return insulationStep(sheet);
  if (sheet.has('protection')) return protectionStep(sheet);
  return sheet.keep('F', 1, 'F');
}

/** Whether drainage and fire fighting are adequate; a silent yes is said in a warning. */
export function drainageAdequate(sheet: SheetBuilder): boolean {
  if (!sheet.has('adequate_drainage'))
    sheet.warn(
      'DRAINAGE_ASSUMED',
      'Adequate drainage and fire fighting are assumed; without them the heat input is 64 % higher.',
    );
  return sheet.flag('adequate_drainage', true);
}
