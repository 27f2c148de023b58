/* Installed area: what the credited members of a group offer, effective (letter) area or actual flow area, never mixed. */
import { quantityOf, type ReliefPoint } from '@domain/basis';
import { areaOf, orificeByLetter } from '@engine/methods/i-letters';
import { toSI } from '@engine/quantity';
import { type Sheet } from './types';
import { creditedMembers, type CredibleAnswer, type Work } from './work';

export type AreaKind = 'effective' | 'actual';
/** Installed area in m², and how many members offer it; `lacking` are the tags of members without an area of this kind. */
export type Installed = { kind: AreaKind; m2: number; members: number; lacking: string[] };

const ACTUAL_TOPICS = /^(external:)?(i\.iso|t\.|j\.|k\.|a\.rated)/;

/** The kind of area that a size sheet ends in: topics a to d effective, unless a certified coefficient entered; topics i to k actual. */
export function areaKindOf(sheet: Sheet): AreaKind {
  const said = sheet.outputs['area_kind'];
  if (said === 'effective' || said === 'actual') return said;
  if (ACTUAL_TOPICS.test(sheet.method)) return 'actual';
  return (sheet.from['Kd'] ?? '').startsWith('reliefPoints/') ? 'actual' : 'effective';
}

/** Effective area of a relief point in m²: as entered, else the printed area of its letter (API 526) in the basis's own units. */
export function effectiveArea(point: ReliefPoint, units: 'SI' | 'US' = 'SI'): number | undefined {
  const entered = quantityOf(point.orifice.effective);
  if (entered) return toSI(entered);
  const orifice = point.orifice.letter === undefined ? undefined : orificeByLetter(point.orifice.letter);
  return orifice && toSI({ value: areaOf(orifice, units), unit: units === 'US' ? 'in2' : 'mm2' });
}

/** Actual flow area of a relief point in m², for the direction that is asked. */
export function actualArea(point: ReliefPoint, vacuum = false): number | undefined {
  const area = quantityOf(vacuum ? (point.orifice.vacuum ?? point.orifice.actual) : point.orifice.actual);
  return area && toSI(area);
}

/** The installed area of one kind for an answer: credited members only. */
export function installedFor(work: Work, ca: CredibleAnswer, kind: AreaKind): Installed {
  const installed: Installed = { kind, m2: 0, members: 0, lacking: [] };
  if (!ca.group) return installed;
  const vacuum = ca.answer.accumulation === 'tank-vacuum' || ca.scenario.key === 'vacuum';
  for (const { point } of creditedMembers(work.lookup, ca.group, ca.answer)) {
    const area = kind === 'effective' ? effectiveArea(point, work.basis.units) : actualArea(point, vacuum);
    if (area === undefined) installed.lacking.push(point.tag);
    else {
      installed.m2 += area;
      installed.members += 1;
    }
  }
  return installed;
}
