/* Method j.certified-coefficient: from measured coefficients of discharge to the one that may be used, 0.9 of their mean. */
import { type Method } from '../../catalog/types';
import { type SheetBuilder, workSheet } from '../../sheet';
import { input, optional, output } from '../common/describe';
import { certifiedFrom, DERATING, TEST_BAND } from './certified';

const CLAUSE = 'ASME XIII, certified coefficient; EN ISO 4126-1, derated coefficient';

/** Most tests that one sheet takes. */
const MOST_TESTS = 100;

/** The coefficients measured, in the order given: K_measured, K_measured_2 … without a gap. */
function readTests(sheet: SheetBuilder): { names: string[]; values: number[] } {
  const names = ['K_measured'];
  while (names.length < MOST_TESTS && sheet.has(`K_measured_${names.length + 1}`))
    names.push(`K_measured_${names.length + 1}`);
  const values = names.map((name, i) => sheet.number(name, '-', { above: 0, max: 1 }, `K_{D,${i + 1}}`));
  return { names, values };
}

/** j.certified-coefficient: certified (derated) coefficient from tests. */
export const CERTIFIED_COEFFICIENT: Method = {
  id: 'j.certified-coefficient',
  version: 1,
  topic: 'j.certified-coefficient',
  title: 'Certified coefficient of discharge from tests',
  editions: ['ASME XIII:2021; EN ISO 4126-1:2013'],
  source:
    'ASME BPVC Section XIII (VIII-1 UG-131 before 2021) and EN ISO 4126-1: 0.9 of the mean of the tests, each within 5 % of it; from memory',
  validity:
    'Coefficients measured on actual flow area with one kind of fluid, gas or liquid; a certified coefficient belongs to actual areas and never to the effective areas of letters.',
  inputs: [
    input('K_measured', 'measured coefficient of discharge', 'dimensionless', { rangeKey: 'kdGas' }),
    optional('K_claimed', 'coefficient claimed by the maker, to be compared', 'dimensionless', {
      rangeKey: 'kdGas',
    }),
  ].map((one) => (one.name === 'K_measured' ? { ...one, each: 'test' } : one)),
  outputs: [
    output('K_mean', 'mean of the tests', 'dimensionless'),
    output('spread', 'largest distance of a test from the mean', 'dimensionless'),
    output('tests_agree', 'whether every test lies within 5 % of the mean'),
    output('K_certified', 'certified coefficient, 0.9 of the mean', 'dimensionless'),
    output('claim_holds', 'whether the coefficient claimed is not above it'),
  ],
  work(inputs, edition) {
    return workSheet(this, inputs, edition, (sheet) => {
      const { names, values } = readTests(sheet);
      const { mean, spread, certified } = certifiedFrom(values);
      sheet.step(
        {
          key: 'Km',
          tex: '\\bar K_D',
          meaning: `mean of ${values.length === 1 ? 'one test' : `${values.length} tests`}`,
          value: mean,
          unit: '-',
          clause: CLAUSE,
        },
        (v) => `\\frac{${names.map(v).join(' + ')}}{${values.length}}`,
      );
      sheet.output('K_mean', mean);
      sheet.output('spread', spread);
      sheet.output('tests_agree', spread <= TEST_BAND);
      if (spread > TEST_BAND)
        sheet.warn(
          'TESTS_APART',
          `One test lies ${(100 * spread).toFixed(1)} % from the mean; more than 5 % cannot be certified without further tests.`,
          'within 5 % of the mean',
        );
      if (values.length < 3)
        sheet.warn(
          'FEW_TESTS',
          'Certification rests on several valves and pressures (nine tests in ASME XIII, from memory).',
        );
      const K = sheet.step(
        {
          key: 'K',
          meaning: 'certified (derated) coefficient',
          value: certified,
          unit: '-',
          clause: CLAUSE,
          memory: true,
        },
        (v) => `${DERATING} \\cdot ${v('Km')}`,
      );
      sheet.output('K_certified', K);
      if (!sheet.has('K_claimed')) return;
      const claimed = sheet.number('K_claimed', '-', { above: 0, max: 1 }, 'K');
      sheet.output('claim_holds', claimed <= K * (1 + 1e-9));
      if (claimed > K * (1 + 1e-9))
        sheet.warn('CLAIM_ABOVE_TESTS', 'The coefficient claimed is above 0.9 of the mean of these tests.');
    });
  },
};
