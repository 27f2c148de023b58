/* The rows that a document contributes to the registers: figures as SI reals with the unit in which they are shown. */
import { type Basis, type Day, type Id, type Instant } from '@domain/basis';
import { type Verdict } from '@domain/evaluate';
import { type Q, toSI } from '@engine/quantity';

export type Truth = 'in-force' | 'approved';

/** What the document itself does not know of its row. */
export type ProjectionFacts = {
  siteId: Id;
  revision?: number;
  caseId?: Id;
  ownerId?: Id;
  inForceSince?: Instant;
  /** Outcomes of the rulebook on it, counted by severity. */
  stops?: number;
  justifies?: number;
};

export type RowHead = { siteId: Id; unitId: Id; elementId: Id; tag: string; name: string };

type Sized = {
  requiredSi: number | null;
  requiredUnit: string | null;
  use: number | null;
  margin: number | null;
  verdict: Verdict;
};

export type SystemRow = RowHead &
  Sized & {
    revision: number | null;
    caseId: Id | null;
    service: string;
    grade: Basis['grade'];
    ownerId: Id | null;
    points: number;
    devices: string;
    governing: string | null;
    governingName: string | null;
    governingGroup: string | null;
    loadSi: number | null;
    loadUnit: string | null;
    installedSi: number | null;
    installedUnit: string | null;
    letter: string | null;
    stops: number;
    justifies: number;
    examinedOn: Day | null;
    inForceSince: Instant | null;
  };

export type PointRow = RowHead &
  Sized & {
    systemTag: string;
    equipment: string;
    kind: string;
    purpose: string;
    service: string;
    setSi: number | null;
    setUnit: string | null;
    letter: string | null;
    areaSi: number | null;
    areaUnit: string | null;
    governing: string | null;
    governingName: string | null;
    ratedSi: number | null;
    ratedUnit: string | null;
    inletLoss: number | null;
    backSi: number | null;
    backUnit: string | null;
    dischargesTo: string;
  };

export type ScenarioRow = RowHead &
  Omit<Sized, 'margin'> & {
    systemTag: string;
    key: string;
    ord: number;
    disposition: string | null;
    groupName: string | null;
    loadSi: number | null;
    loadUnit: string | null;
    relievingSi: number | null;
    relievingUnit: string | null;
    governs: boolean;
    examinedOn: Day | null;
  };

export type ConditionRow = RowHead & {
  systemTag: string;
  kind: string;
  requires: string;
  supports: string[];
  roundMonths: number | null;
};

/** The SI value of a quantity, or null. */
export function si(q: Q | undefined): number | null {
  return q ? toSI(q) : null;
}

/** The unit of a quantity, or null. */
export function unit(q: Q | undefined): string | null {
  return q?.unit ?? null;
}
