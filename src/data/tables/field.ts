/* Rows about field sheets, discrepancies, fitted devices, impairments and files. */
import { type Q } from '@engine/quantity';
import { type Attachment, type Day, type Id, type Impairment, type Instant, type Path } from '@domain/case';
import { table } from '../mapping';

/** A line of a field sheet, made from the signed revision and made again when that changes. */
export type FieldLineRow = {
  caseId: Id;
  documentId: Id;
  key: Path;
  ord: number;
  grouped: string;
  label: string;
  /** What was signed; never sent before the line was seen. */
  wants: Q | string | null;
  photo: boolean;
  holds: boolean;
  /** Whatever else the domain keeps with a line. */
  facts: Record<string, unknown>;
};
export type FieldEntryRow = {
  id: Id;
  /** Made by the phone, so that a batch sent twice is stored once. */
  clientId: string;
  caseId: Id;
  documentId: Id;
  line: Path;
  asWhat: 'installer' | 'verifier';
  installer: string | null;
  seen: Q | string | null;
  text: string | null;
  files: Id[];
  scan: string | null;
  byId: Id;
  saw: Instant;
  got: Instant;
  device: string;
  shownAt: Instant | null;
  cannot: { why: 'reach' | 'painted' | 'insulated' | 'other'; means: string; second: Id } | null;
  agrees: boolean | null;
};
export type DiscrepancyRow = {
  id: Id;
  caseId: Id;
  documentId: Id;
  number: number;
  entryId: Id;
  holds: boolean;
  state: 'open' | 'fixed' | 'seen-again' | 'sent-back' | 'accepted';
  ownerId: Id;
  clears: string;
  findingId: Id | null;
  posts: { by: Id; at: Instant; text: string }[];
  version: number;
};

export type Plate = {
  tag?: string;
  set?: Q;
  cdtp?: Q;
  burst?: Q;
  lot?: string;
  capacity?: Q;
  medium?: string;
  at?: string;
  spring?: string;
  area?: Q;
  size?: string;
};
export type DeviceRow = {
  id: Id;
  siteId: Id;
  serial: string;
  maker: string | null;
  model: string | null;
  year: number | null;
  code: string | null;
  plate: Plate;
  version: number;
};
/** Where a device sat from and until a day; a later row of the same device, point and first day replaces what was known. */
export type PlaceRow = {
  id: Id;
  deviceId: Id;
  documentId: Id;
  point: Id;
  fromDay: Day;
  toDay: Day | null;
  knownAt: Instant;
  byId: Id | null;
};
export type TestBody = {
  shop?: string;
  authorised?: boolean;
  received?: Q;
  left?: Q;
  leakage?: string;
  seals?: string[];
  note?: string;
};
export type TestRow = { id: Id; deviceId: Id; onDay: Day; body: TestBody; fileId: Id | null };
export type InKindRow = {
  id: Id;
  documentId: Id;
  point: Id;
  oldId: Id | null;
  newId: Id;
  comparison: unknown;
  equal: boolean;
  byId: Id;
  at: Instant;
  signatureId: Id | null;
};
export type ImpairmentRow = {
  id: Id;
  documentId: Id;
  point: Id;
  fromAt: Instant;
  untilAt: Instant;
  byId: Id;
  cover: Impairment['cover'];
  substitute: string | null;
  attendant: string | null;
  handovers: Impairment['handovers'];
  endedAt: Instant | null;
  version: number;
};
export type SightingRow = {
  id: Id;
  documentId: Id;
  condition: Id;
  at: Instant;
  byId: Id;
  agrees: boolean;
  entryId: Id | null;
};

export type FileRow = {
  id: Id;
  siteId: Id;
  sha256: string;
  bytes: number;
  type: string;
  name: string;
  state: 'held' | 'referred' | 'swept';
  byId: Id | null;
  at: Instant;
};
export type AttachmentRow = {
  id: Id;
  fileId: Id;
  ofId: string;
  path: Path | null;
  caption: string | null;
  shows: Attachment['shows'];
  byId: Id;
  at: Instant;
};

export const FIELD_LINES = table<FieldLineRow>('field_lines', { json: ['wants', 'facts'], flags: ['photo', 'holds'] });
export const FIELD_ENTRIES = table<FieldEntryRow>('field_entries', {
  json: ['seen', 'files', 'cannot'],
  flags: ['agrees'],
});
export const DISCREPANCIES = table<DiscrepancyRow>('discrepancies', { json: ['posts'], flags: ['holds'] });
export const DEVICES = table<DeviceRow>('fitted_devices', { json: ['plate'] });
export const PLACES = table<PlaceRow>('places');
export const TESTS = table<TestRow>('device_tests', { json: ['body'] });
export const IN_KIND = table<InKindRow>('in_kind', { json: ['comparison'], flags: ['equal'] });
export const IMPAIRMENTS = table<ImpairmentRow>('impairments', { json: ['handovers'] });
export const SIGHTINGS = table<SightingRow>('condition_sightings', { flags: ['agrees'] });
export const FILES = table<FileRow>('files');
export const ATTACHMENTS = table<AttachmentRow>('attachments');
