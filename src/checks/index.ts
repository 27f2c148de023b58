/* The check values of the tests, bundled with the server, so that the method file shows the very values that are tested. */
import { casesIn, type CheckCase } from './case';

export { casesIn, type CheckCase, type Expected } from './case';
export { compared, type Compared } from './compare';

const FILES = import.meta.glob<unknown>('../../tests/reference/*.json', { eager: true, import: 'default' });

/** Every case of check values, in the order of the files. */
export const CHECK_CASES: readonly CheckCase[] = Object.values(FILES).flatMap(casesIn);
