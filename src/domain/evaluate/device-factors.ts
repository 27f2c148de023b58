/* Coefficients of the devices of a group: Kd, Kb, Kw and Kc, entered, from the balanced-valve charts, or the method's own. */
import { type F, type Path, quantityOf, type ReliefPoint } from '@domain/basis';
import { methodById, workMethod } from '@engine/catalog';
import { convert, fromSI } from '@engine/quantity';
import { type BackPressure } from './back-pressure';
import { type Found } from './inputs';
import { effectiveArea } from './installed';
import { type Values } from './implicit';
import { outputOf } from './sheets';
import { creditedMembers, type CredibleAnswer, type Work } from './work';

/** Effective coefficients of API 520-1 (from memory of the standard), by topic. */
const EFFECTIVE_KD: Record<string, number> = { a: 0.975, b: 0.975, c: 0.65, d: 0.85, e: 0.975 };
/** Methods whose coefficient is another than that of their topic. */
const KD_OF_METHOD: Record<string, number> = {
  'c.liquid-noncertified': 0.62,
  'd.omega-subcooled': 0.65,
  'd.real-gas-size': 0.975,
};
/** Methods that choose by the phase that they find at the inlet. */
const KD_BY_PHASE = new Set(['d.hem-size', 'd.comparison']);

type Coefficient = 'gas' | 'liquid' | 'kb' | 'kw' | 'kc';
const one = (path: Path): Found => ({ value: { value: 1, unit: '-' }, path });

/** The lowest entered value of one coefficient among the members, with its path. */
function lowest(
  points: readonly ReliefPoint[],
  field: Coefficient,
): { found: Found; value: number } | undefined {
  const all = points.flatMap((point) => {
    const figure: F | undefined = point.k?.[field];
    const q = quantityOf(figure);
    return q ? [{ found: { value: q, path: `reliefPoints/${point.id}/k/${field}` }, value: q.value }] : [];
  });
  return all.toSorted((a, b) => a.value - b.value)[0];
}

function dischargeCoefficient(points: readonly ReliefPoint[], method: string): Found | undefined {
  const topic = method.charAt(0);
  const certified = lowest(points, topic === 'c' || method.includes('liquid') ? 'liquid' : 'gas')?.found;
  const effective = EFFECTIVE_KD[topic];
  const onlyActual = points.length > 0 && points.every((point) => effectiveArea(point) === undefined);
  if (effective === undefined || (onlyActual && certified)) return certified;
  if (KD_BY_PHASE.has(method)) return undefined;
  const value = KD_OF_METHOD[method] ?? effective;
  return { value: { value, unit: '-' }, path: 'method default' };
}

/** Kc as entered; under an uncertified disk the site's default. */
function combination(work: Work, points: readonly ReliefPoint[]): Found {
  const entered = lowest(points, 'kc');
  if (entered) return entered.found;
  const above = points.find((point) => point.with?.side === 'inlet');
  if (!above) return one('method default');
  const site = work.rules.parameters['kcDefault'];
  return {
    value: { value: typeof site === 'number' ? site : 0.9, unit: '-' },
    path: `reliefPoints/${above.id}/with`,
  };
}

type Curve = { work: Work; ca: CredibleAnswer; back: BackPressure; name: 'Kb' | 'Kw' };

/** The factor of a balanced valve from the general chart, at the back pressure found; 1 for every other valve. */
function chartFactor(points: readonly ReliefPoint[], curve: Curve): Found | undefined {
  const balanced = points.find((point) => point.axes.balance !== 'none');
  if (!balanced) return one('method default');
  const method = curve.name === 'Kb' ? 'a.backpressure-factor' : 'c.backpressure-factor';
  const set = quantityOf(balanced.set);
  if (!methodById(method) || !set) return one('method default');
  const gauge = curve.back.pa - convert(curve.work.context.barometer, 'Pa_abs');
  if (gauge <= 0) return one(curve.back.path);
  const overpressure = outputOf(curve.work.sheets[`limit:${curve.ca.id}`], 'overpressure') ?? {
    value: 0.1,
    unit: '-',
  };
  const worked = workMethod(method, {
    set_pressure: set,
    back_pressure: fromSI(gauge, 'kPa_g'),
    overpressure,
  });
  const factor = worked.refused ? undefined : worked.outputs[curve.name];
  return typeof factor === 'object' ? { value: factor, path: `method ${method}` } : undefined;
}

/** Coefficients under the names that methods use. */
export function factorValues(work: Work, ca: CredibleAnswer, method: string, back: BackPressure): Values {
  const points = ca.group ? creditedMembers(work.lookup, ca.group, ca.answer).map(({ point }) => point) : [];
  const kd = () => dischargeCoefficient(points, method);
  return {
    Kd: kd,
    Kdr: kd,
    Kb: () => lowest(points, 'kb')?.found ?? chartFactor(points, { work, ca, back, name: 'Kb' }),
    Kw: () => lowest(points, 'kw')?.found ?? chartFactor(points, { work, ca, back, name: 'Kw' }),
    Kc: () => combination(work, points),
  };
}
