/* Devices of the invented site as the register of fitted devices: serial, plate, place and last test. */
import { type FittedDevice } from '@domain/basis';
import supplement from '../data/supplement/site.json';
import { isVent } from './axes';
import { type DemoDevice, type DemoSystem } from './demo-types';
import { compact, plainQ } from './figures';
import { documentId, idOf, personId } from './ids';
import { pointId } from './points';

/** A fitted device of a system, with the document that holds its relief point. */
export type Fitted = { device: FittedDevice; document: string };

const OPERATIONS: Record<string, string> = { U300: 'P-08', U400: 'P-08', U600: 'P-08' };

function plateOf(device: DemoDevice): FittedDevice['plate'] {
  const area = device.actual_area ?? device.effective_area;
  const set = device.set_pressure ?? device.set_vacuum;
  const cold = device.nameplate.cold_differential_test_pressure;
  const burst = device.burst?.marked_burst_pressure;
  return compact({
    tag: device.tag,
    set: set && !burst ? plainQ(set) : undefined,
    cdtp: cold && plainQ(cold),
    burst: burst && plainQ(burst),
    lot: device.burst?.lot,
    at: device.burst ? `${String(device.burst.at_temperature.value)} °C` : undefined,
    medium: isVent(device) ? 'air' : undefined,
    area: area && plainQ(area),
    size: device.connections ?? device.size_text,
  });
}

function testsOf(device: DemoDevice): FittedDevice['tests'] {
  const test = device.last_test;
  if (!test) return [];
  const shop = device.nameplate.code_symbol === 'CE' ? supplement.shops.EN : supplement.shops.ASME;
  return [
    {
      id: idOf('ts', device.nameplate.serial, test.date),
      on: test.date,
      shop,
      authorised: true,
      received: plainQ(test.as_received_pop),
      left: plainQ(test.as_left_pop),
      leakage: test.seat_leakage,
      seals: ['cap seal intact', 'ring seal intact'],
    },
  ];
}

/** The fitted device of a relief point; it has been there since its year or its last test, whichever is later. */
export function fittedOf(device: DemoDevice, system: DemoSystem): Fitted {
  const from = device.last_test?.date ?? `${String(device.nameplate.year)}-06-30`;
  const by = personId(OPERATIONS[system.unit] ?? 'P-07');
  const known = `${from}T15:00:00.000Z`;
  return {
    document: documentId(system.id),
    device: {
      id: idOf('fd', device.nameplate.serial),
      serial: device.nameplate.serial,
      year: device.nameplate.year,
      code: device.nameplate.code_symbol,
      plate: plateOf(device),
      places: [{ point: pointId(device.tag), from, known, by }],
      tests: testsOf(device),
    },
  };
}
