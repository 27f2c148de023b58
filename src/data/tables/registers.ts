/* Rows of the registers: projections of a document, or of an element of it, for one truth. */
import { type Day, type Id, type Instant } from '@domain/case';
import { type Verdict } from '@domain/evaluate';
import { type Table, table } from '../mapping';
import { type Grade } from './documents';

export type Truth = 'in-force' | 'approved';
/** What every register row begins with; `elementId` is empty where the row is a whole document. */
export type RegisterHead = {
  documentId: Id;
  truth: Truth;
  elementId: Id;
  siteId: Id;
  unitId: Id;
  tag: string;
  name: string;
};

/** Figures stand in coherent SI with the unit in which they were entered, for show. Pressures: Pa gauge unless said. */
export type SystemRow = RegisterHead & {
  revision: number | null;
  caseId: Id | null;
  service: string;
  grade: Grade;
  ownerId: Id | null;
  points: number;
  /** Tags of the relief points, joined by a comma, for search and show. */
  devices: string;
  governing: string | null;
  governingName: string | null;
  governingGroup: string | null;
  loadSi: number | null;
  loadUnit: string | null;
  requiredSi: number | null;
  requiredUnit: string | null;
  installedSi: number | null;
  installedUnit: string | null;
  letter: string | null;
  /** Required over installed. */
  use: number | null;
  /** Installed over required, minus one. */
  margin: number | null;
  verdict: Verdict;
  stops: number;
  justifies: number;
  examinedOn: Day | null;
  inForceSince: Instant | null;
};
export type PointRow = RegisterHead & {
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
  requiredSi: number | null;
  requiredUnit: string | null;
  ratedSi: number | null;
  ratedUnit: string | null;
  /** Fraction of the set pressure. */
  inletLoss: number | null;
  backSi: number | null;
  backUnit: string | null;
  use: number | null;
  margin: number | null;
  verdict: Verdict;
  dischargesTo: string;
};
export type ScenarioRow = RegisterHead & {
  systemTag: string;
  key: string;
  ord: number;
  disposition: string | null;
  groupName: string | null;
  loadSi: number | null;
  loadUnit: string | null;
  requiredSi: number | null;
  requiredUnit: string | null;
  relievingSi: number | null;
  relievingUnit: string | null;
  use: number | null;
  verdict: Verdict;
  governs: boolean;
  examinedOn: Day | null;
};
export type ConditionRow = RegisterHead & {
  systemTag: string;
  kind: string;
  requires: string;
  /** Ids of the scenarios that it supports. */
  supports: string[];
  roundMonths: number | null;
  seenAt: Instant | null;
  agrees: boolean | null;
};
export type HeaderRow = RegisterHead & {
  revision: number | null;
  caseId: Id | null;
  service: string;
  disposesTo: string;
  members: number;
  causes: number;
  governing: string | null;
  governingName: string | null;
  backSi: number | null;
  backUnit: string | null;
  mach: number | null;
  use: number | null;
  verdict: Verdict;
};

export type DependRow = {
  siteId: Id;
  tag: string;
  quantity: string;
  documentId: Id;
  truth: Truth;
  path: string;
  kind: 'load' | 'bound' | 'condition' | 'origin' | 'assumption' | 'utility';
};
/** A page of the full-text search; `place` is a link below the site; `hides`: it shows results of its document or case. */
export type SearchPage = {
  kind: string;
  siteId: Id;
  /** The document or case that it belongs to. */
  ofId: Id;
  place: string;
  hides: boolean;
  title: string;
  body: string;
};

export const P_SYSTEMS = table<SystemRow>('p_systems');
export const P_POINTS = table<PointRow>('p_points');
export const P_SCENARIOS = table<ScenarioRow>('p_scenarios', { flags: ['governs'] });
export const P_CONDITIONS = table<ConditionRow>('p_conditions', { json: ['supports'], flags: ['agrees'] });
export const P_HEADERS = table<HeaderRow>('p_headers');
export const P_DEPENDS = table<DependRow>('p_depends');
export const SEARCH_PAGES = table<SearchPage>('search_pages', { flags: ['hides'] });

/** A register: its table, the columns by which it may be sorted and filtered, those that show results, and those searched. */
export type Register<R extends RegisterHead> = {
  table: Table<R>;
  columns: readonly (keyof R & string)[];
  results: readonly (keyof R & string)[];
  text: readonly (keyof R & string)[];
};

const head = ['tag', 'name', 'unitId', 'documentId', 'elementId'] as const;

const systems: Register<SystemRow> = {
  table: P_SYSTEMS,
  results: [
    ...(['governing', 'governingName', 'governingGroup', 'loadSi', 'loadUnit', 'requiredSi', 'requiredUnit'] as const),
    ...(['installedSi', 'installedUnit', 'letter', 'use', 'margin', 'verdict', 'stops', 'justifies'] as const),
  ],
  columns: [
    ...head,
    ...(['revision', 'service', 'grade', 'ownerId', 'points', 'governing', 'governingName', 'loadSi'] as const),
    ...(['requiredSi', 'installedSi', 'letter', 'use', 'margin', 'verdict', 'stops', 'justifies'] as const),
    ...(['examinedOn', 'inForceSince'] as const),
  ],
  text: ['tag', 'name', 'service', 'devices'],
};

const points: Register<PointRow> = {
  table: P_POINTS,
  results: [
    ...(['setSi', 'setUnit', 'letter', 'areaSi', 'areaUnit', 'governing', 'governingName', 'requiredSi'] as const),
    ...(['requiredUnit', 'ratedSi', 'ratedUnit', 'inletLoss', 'backSi', 'backUnit', 'use', 'margin'] as const),
    'verdict',
  ],
  columns: [
    ...head,
    ...(['systemTag', 'equipment', 'kind', 'purpose', 'service', 'setSi', 'letter', 'areaSi'] as const),
    ...(['governing', 'governingName', 'requiredSi', 'ratedSi', 'inletLoss', 'backSi', 'use', 'margin'] as const),
    ...(['verdict', 'dischargesTo'] as const),
  ],
  text: ['tag', 'name', 'systemTag', 'equipment', 'kind'],
};

const scenarios: Register<ScenarioRow> = {
  table: P_SCENARIOS,
  results: [
    ...(['groupName', 'loadSi', 'loadUnit', 'requiredSi', 'requiredUnit', 'relievingSi', 'relievingUnit'] as const),
    ...(['use', 'verdict', 'governs'] as const),
  ],
  columns: [
    ...head,
    ...(['systemTag', 'key', 'ord', 'disposition', 'loadSi', 'requiredSi', 'use', 'verdict', 'governs'] as const),
    'examinedOn',
  ],
  text: ['tag', 'name', 'systemTag'],
};

const conditions: Register<ConditionRow> = {
  table: P_CONDITIONS,
  results: [],
  columns: [...head, 'systemTag', 'kind', 'roundMonths', 'seenAt', 'agrees'],
  text: ['tag', 'name', 'systemTag', 'kind', 'requires'],
};

const headers: Register<HeaderRow> = {
  table: P_HEADERS,
  results: ['governing', 'governingName', 'backSi', 'backUnit', 'mach', 'use', 'verdict'],
  columns: [
    ...head,
    ...(['revision', 'service', 'disposesTo', 'members', 'causes', 'governingName', 'backSi', 'mach'] as const),
    ...(['use', 'verdict'] as const),
  ],
  text: ['tag', 'name', 'service'],
};

export const REGISTERS = { systems, points, scenarios, conditions, headers };
