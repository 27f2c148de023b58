/* The public face of the registers. */
export { PAGE_SIZE } from './ask';
export { type CaseLink } from './around';
export { csvCell, pointsCsv, systemsCsv } from './csv';
export { type Cell, type Sized } from './figures';
export { type PointLine, pointsView } from './points';
export { pointRows, systemRows } from './rows';
export { type RegisterView, type SystemLine, systemsView, type Waiting } from './systems';
