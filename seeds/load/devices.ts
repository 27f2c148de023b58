/* Writes the register of fitted devices: what sits at each relief point, since when, and its last test. */
import { addDevice, addPlace, addTest } from '@data/devices';
import { type DemoCase } from '../cases/demo-case-types';
import { changed } from '../cases/change';
import { fittedOf, type Fitted, SITE } from '../convert';
import { SITE_ID, type World } from './world';

/** The plant as it stands: documents in force, but what operations fitted in an emergency hangs on the nozzle already. */
function fittedNow(): Fitted[] {
  const acted = (SITE.cases as DemoCase[]).filter((demo) => demo.emergency);
  return SITE.systems.flatMap((system) => {
    const changes = acted.flatMap((demo) => demo.changes).filter((change) => change.system === system.id);
    const now = changes.length > 0 ? changed(system, changes, 'new') : system;
    return now.devices.map((device) => fittedOf(device, now));
  });
}

async function writeOne(world: World, { device, document }: Fitted): Promise<void> {
  const { id, serial, year, code, plate, places, tests } = device;
  const { shift, trx } = world;
  await addDevice(trx, { id, siteId: SITE_ID, serial, year: year ?? null, code: code ?? null, plate });
  for (const place of places) {
    await addPlace(trx, {
      deviceId: id,
      documentId: document,
      point: place.point,
      fromDay: shift.day(place.from),
      knownAt: shift.instant(place.known),
      byId: place.by,
    });
  }
  for (const { on, id: _id, file: _file, ...body } of tests) {
    await addTest(trx, { deviceId: id, onDay: shift.day(on), body });
  }
}

/** Writes all fitted devices. */
export async function writeDevices(world: World): Promise<void> {
  for (const fitted of fittedNow()) await writeOne(world, fitted);
}
