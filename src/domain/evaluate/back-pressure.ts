/* Back pressure of an answer: from an outlet sheet, the relief point's superimposed pressure, the end of its line or its header. */
import { type Line, type Path, quantityOf, type ReliefPoint } from '@domain/basis';
import { convert, type Q } from '@engine/quantity';
import { externalFigure, externalsFor } from './external';
import { creditedMembers, type CredibleAnswer, type Work } from './work';

/** Absolute back pressure at the outlet of the device, Pa, and where it came from. */
export type BackPressure = { pa: number; path: Path };

/** The back pressure as a function of the flow through the group, kg/s; own-relief hydraulics join here. */
export type BackPressureOf = (flow: number) => BackPressure;

function absolute(work: Work, q: Q): number {
  return convert(q, 'Pa_abs', work.context);
}

/** The outlet line of a relief point. */
export function outletOf(work: Pick<Work, 'basis'>, point: ReliefPoint): Line | undefined {
  return work.basis.lines.find((line) => line.point === point.id && line.side === 'outlet');
}

function fromSheets(work: Work, point: ReliefPoint): BackPressure | undefined {
  const found = externalsFor(work, 'outlet', point).flatMap((sheet) => {
    const total = externalFigure(sheet, 'P2', 'total_back_pressure', 'back_pressure_used');
    return total ? [{ pa: absolute(work, total.q), path: total.path }] : [];
  });
  return found.toSorted((a, b) => b.pa - a.pa)[0];
}

function fromPoint(work: Work, point: ReliefPoint): BackPressure | undefined {
  const stated = quantityOf(point.superimposed?.max) ?? quantityOf(point.superimposed?.min);
  if (stated) return { pa: absolute(work, stated), path: `reliefPoints/${point.id}/superimposed` };
  const line = outletOf(work, point);
  const end = quantityOf(line?.end?.pressureMax) ?? quantityOf(line?.end?.pressure);
  return line && end && { pa: absolute(work, end), path: `lines/${line.id}/end` };
}

function fromHeader(work: Work, point: ReliefPoint): BackPressure | undefined {
  const header = outletOf(work, point)?.end?.header;
  const imported = header === undefined ? undefined : work.imports.headers[header];
  if (header === undefined || !imported) return undefined;
  const pressures = [imported.normal, ...Object.values(imported.causes).map((cause) => cause.at)];
  return { pa: Math.max(...pressures.map((q) => absolute(work, q))), path: `imports/${header}` };
}

/** The back pressure on one relief point with nothing flowing through the group itself, or what an outlet sheet says. */
export function pointBackPressure(work: Work, point: ReliefPoint): BackPressure {
  return (
    fromSheets(work, point) ??
    fromPoint(work, point) ??
    fromHeader(work, point) ?? { pa: absolute(work, work.context.barometer), path: 'site/barometer' }
  );
}

/** The back pressure of an answer: the highest among its credited members, the same at every flow until lines are worked. */
export function backPressureOf(work: Work, ca: CredibleAnswer): BackPressureOf {
  const members = ca.group ? creditedMembers(work.lookup, ca.group, ca.answer) : [];
  const pressures = members.map(({ point }) => pointBackPressure(work, point));
  const highest = pressures.toSorted((a, b) => b.pa - a.pa)[0];
  const used = highest ?? { pa: absolute(work, work.context.barometer), path: 'site/barometer' };
  return () => used;
}
