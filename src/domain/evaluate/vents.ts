/* Rated capacity of tank vents: what each passes at its certified full flow, out of the tank and into it. */
import { type Path, quantityOf, type ReliefPoint } from '@domain/basis';
import { fromSI, type Q, toSI } from '@engine/quantity';
import { actualArea } from './installed';
import { type Made, workedSheet } from './sheets';
import { type Sheet } from './types';
import { creditedMembers, type Work } from './work';

const METHOD = 'k.weighted-vent';

/** The coefficient by which the vent was sized in one direction, with its path. */
function coefficientOf(work: Work, point: ReliefPoint, vacuum: boolean): { q: Q; path: Path } | undefined {
  const accumulation = vacuum ? 'tank-vacuum' : 'tank';
  for (const ca of work.answers) {
    if (ca.answer.accumulation !== accumulation || !ca.group) continue;
    const counts = creditedMembers(work.lookup, ca.group, ca.answer).some((one) => one.point.id === point.id);
    const size = work.sheets[`size:${ca.id}`];
    const Kd = size?.method.startsWith('k.vent-area') === true ? size.inputs['Kd'] : undefined;
    if (counts && typeof Kd === 'object') return { q: Kd, path: size?.from['Kd'] ?? `sheets/size:${ca.id}` };
  }
  return undefined;
}

/** A set or full-flow pressure as a gauge reading, whichever way it is kept. */
function gauge(q: Q, vacuum: boolean): Q {
  const size = Math.abs(toSI(q));
  return fromSI(vacuum ? -size : size, 'mbar_g');
}

/** The sheet of one direction; nothing while set, full flow, area or coefficient are not known. */
function ventSheet(work: Work, point: ReliefPoint, vacuum: boolean, key: string): Sheet | undefined {
  const [setField, fullField] = vacuum
    ? (['setVacuum', 'fullFlowVacuum'] as const)
    : (['set', 'fullFlow'] as const);
  const set = quantityOf(point[setField]);
  const full = quantityOf(point[fullField]);
  const area = actualArea(point, vacuum);
  const Kd = coefficientOf(work, point, vacuum);
  if (!set || !full || area === undefined || !Kd) return undefined;
  const at = `reliefPoints/${point.id}`;
  const made: Made = {
    inputs: {
      direction: vacuum ? 'in' : 'out',
      set_pressure: gauge(set, vacuum),
      full_flow_pressure: gauge(full, vacuum),
      seat_area: fromSI(area, work.basis.units === 'US' ? 'in2' : 'mm2'),
      Kd: Kd.q,
      atmospheric_pressure: work.context.barometer,
    },
    from: {
      set_pressure: `${at}/${setField}`,
      full_flow_pressure: `${at}/${fullField}`,
      seat_area: `${at}/orifice/${vacuum && point.orifice.vacuum !== undefined ? 'vacuum' : 'actual'}`,
      Kd: Kd.path,
      atmospheric_pressure: 'site/barometer',
    },
  };
  return workedSheet(key, METHOD, undefined, made, at);
}

/** Makes the rated-capacity sheets of every vent that no other sheet rates: `rated:<point>`, and `rated:<point>/vacuum` beside it. */
export function makeVents(work: Work): void {
  for (const point of work.basis.reliefPoints) {
    const key = `rated:${point.id}`;
    if (work.sheets[key]) continue;
    const out = ventSheet(work, point, false, key);
    if (out) work.sheets[key] = out;
    const into = ventSheet(work, point, true, out ? `${key}/vacuum` : key);
    if (into) work.sheets[into.key] = into;
  }
}
