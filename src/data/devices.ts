/* Fitted devices: where they sit, their tests, replacements in kind; impairments of relief points. */
import { type Id } from '@domain/case';
import { type Db } from './connection';
import { newId } from './ids';
import { findAll, findIn, findOne, fromColumns, insert, type New, updateVersioned } from './mapping';
import {
  type DeviceRow,
  DEVICES,
  IMPAIRMENTS,
  type ImpairmentRow,
  IN_KIND,
  type InKindRow,
  type PlaceRow,
  PLACES,
  type TestRow,
  TESTS,
} from './tables/field';

export type { DeviceRow, ImpairmentRow, InKindRow, PlaceRow, Plate, TestBody, TestRow } from './tables/field';

/** A device that sits at a relief point, with its latest test. */
export type FittedAt = { device: DeviceRow; place: PlaceRow; lastTest: TestRow | null };

/** Adds a fitted device. */
export function addDevice(trx: Db, row: New<DeviceRow>): Promise<void> {
  return insert(trx, DEVICES, row);
}

/** A fitted device by its id. */
export function findDevice(db: Db, id: Id): Promise<DeviceRow | undefined> {
  return findOne(db, DEVICES, { id });
}

/** All fitted devices of a site by serial. */
export function listDevices(db: Db, siteId: Id): Promise<DeviceRow[]> {
  return findAll(db, DEVICES, { siteId }, 'serial');
}

/** Changes what is known of a device at the version that was read; false when another write came first. */
export function updateDevice(trx: Db, id: Id, version: number, patch: Partial<DeviceRow>): Promise<boolean> {
  return updateVersioned(trx, DEVICES, id, version, patch);
}

/** Records where a device sits; the same device, point and first day again replaces what was known (an end, a correction). */
export function addPlace(trx: Db, row: Omit<New<PlaceRow>, 'id'>): Promise<void> {
  return insert(trx, PLACES, { id: newId('place'), ...row });
}

/** Places as they are known now: of rows that speak of the same stay, the one known last. */
function latest(places: readonly PlaceRow[]): PlaceRow[] {
  const stays = new Map<string, PlaceRow>();
  for (const place of places) {
    stays.set(`${place.deviceId} ${place.documentId} ${place.point} ${place.fromDay}`, place);
  }
  return [...stays.values()].sort((a, b) => (a.fromDay < b.fromDay ? -1 : 1));
}

/** Where a device sat and sits, oldest first. */
export async function placesOf(db: Db, deviceId: Id): Promise<PlaceRow[]> {
  return latest(await findAll(db, PLACES, { deviceId }, 'knownAt'));
}

/** What sits now at the relief points of documents. */
export async function fittedAt(db: Db, documentIds: readonly Id[]): Promise<FittedAt[]> {
  const rows = (await db(PLACES.name).whereIn('document_id', documentIds).orderBy('known_at')) as Record<
    string,
    unknown
  >[];
  const present = latest(rows.map((row) => fromColumns(PLACES, row))).filter((place) => place.toDay === null);
  const ids = [...new Set(present.map((place) => place.deviceId))];
  const devices = new Map((await findIn(db, DEVICES, 'id', ids)).map((device) => [device.id, device]));
  const tests = await findIn(db, TESTS, 'deviceId', ids);
  return present.flatMap((place) => {
    const device = devices.get(place.deviceId);
    const own = tests.filter((test) => test.deviceId === place.deviceId).sort((a, b) => (a.onDay < b.onDay ? 1 : -1));
    return device ? [{ device, place, lastTest: own[0] ?? null }] : [];
  });
}

/** Adds a test of a device. */
export function addTest(trx: Db, row: Omit<New<TestRow>, 'id'>): Promise<void> {
  return insert(trx, TESTS, { id: newId('test'), ...row });
}

/** The tests of a device, oldest first. */
export function testsOf(db: Db, deviceId: Id): Promise<TestRow[]> {
  return findAll(db, TESTS, { deviceId }, 'onDay');
}

/** Records a replacement in kind. */
export function addInKind(trx: Db, row: New<InKindRow>): Promise<void> {
  return insert(trx, IN_KIND, row);
}

/** The replacements in kind at a document's relief points, oldest first. */
export function inKindOf(db: Db, documentId: Id): Promise<InKindRow[]> {
  return findAll(db, IN_KIND, { documentId });
}

/** Opens an impairment. */
export function addImpairment(trx: Db, row: New<ImpairmentRow>): Promise<void> {
  return insert(trx, IMPAIRMENTS, row);
}

/** An impairment by its id. */
export function findImpairment(db: Db, id: Id): Promise<ImpairmentRow | undefined> {
  return findOne(db, IMPAIRMENTS, { id });
}

/** Changes an impairment at the version that was read; false when another write came first. */
export function updateImpairment(trx: Db, id: Id, version: number, patch: Partial<ImpairmentRow>): Promise<boolean> {
  return updateVersioned(trx, IMPAIRMENTS, id, version, patch);
}

/** The impairments of a document's relief points that have not ended. */
export function openImpairments(db: Db, documentId: Id): Promise<ImpairmentRow[]> {
  return findAll(db, IMPAIRMENTS, { documentId, endedAt: null }, 'fromAt');
}
