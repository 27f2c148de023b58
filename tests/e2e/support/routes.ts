/* Every page there is, on the invented site, with who may open it. */
import { SITE } from './people';

const cases = `${SITE}/cases/KW-2026-003`;
const system = `${SITE}/systems/SYS-103`;
const SHEET = 'load%3Aclosed-outlet%2Fans_g1';

/** Pages of anybody with a role at the site. */
export const PAGES: readonly string[] = [
  '/account',
  SITE,
  `${SITE}/due`,
  `${SITE}/find?q=101`,
  `${SITE}/register/systems`,
  `${SITE}/register/systems?sort=-use&verdict=marginal`,
  `${SITE}/register/relief-points`,
  `${SITE}/rulebook`,
  `${SITE}/methods`,
  `${SITE}/methods?topic=b`,
  `${SITE}/methods/a.gas`,
  `${SITE}/cases`,
  `${SITE}/cases/new`,
  ...['', '/changes', '/scenarios', '/sheets', '/outcomes', '/unseen', '/findings', '/differences'].map(
    (part) => cases + part,
  ),
  ...['/summary', '/field', '/signatures', '/notices', '/trail'].map((part) => cases + part),
  `${SITE}/cases/KW-2026-016`,
  `${SITE}/cases/KW-2026-005/scenarios`,
  `${SITE}/cases/KW-2026-008/unseen`,
  `${SITE}/cases/KW-2025-036/field`,
  `${SITE}/cases/KW-2025-036/field?at=sign`,
  `${SITE}/cases/KW-2025-036/field?at=start-up`,
  `${SITE}/cases/KW-2025-038/summary`,
  `${SITE}/cases/KW-2025-039`,
  `${SITE}/cases/KW-2025-041/findings`,
  ...['', '/basis', '/relief-points', '/scenarios', '/sheets', '/lines', '/outcomes', '/revisions'].map(
    (part) => system + part,
  ),
  `${system}/sheets/${SHEET}`,
  `${SITE}/systems/SYS-101/revisions/difference?from=4&to=5`,
  `${SITE}/people`,
  `${SITE}/people/per_p04`,
  '/mail',
];
/** Pages of the site coordinator. */
export const COORDINATORS: readonly string[] = [`${SITE}/people/new`];
/** Pages of those who oversee: site coordinators and auditors. */
export const OVERSEERS: readonly string[] = [`${SITE}/methods/moved`];
/** Addresses where nothing is. */
export const NOWHERE: readonly string[] = [
  '/no-such-page',
  `${SITE}/cases/KW-2099-001`,
  `${SITE}/systems/SYS-999`,
  `${SITE}/cases/KW-2026-003/sheets/no-such-sheet`,
  `${SITE}/systems/SYS-103/sheets/%25`,
  '/s/elsewhere',
];
/** One of each role, by name. */
export const ONE_OF_EACH = {
  originator: 'Owen Tarrant',
  checker: 'Ilse Fennimore',
  approver: 'Grace Okonta',
  operations: 'Tomas Adeyre',
  coordinator: 'Neil Castering',
  auditor: 'Aoife Renshaw',
} as const;
