/* The field sheet of one relief point: what its plates, seals, valves, lines and discharge must show. */
import { type Basis, type Isolation, quantityOf, type ReliefPoint } from '@domain/basis';
import { type Q } from '@engine/quantity';

export type Draft = { at: string; group: string; label: string; wants?: Q | string; photo?: boolean };

type Maybe = Q | string | undefined;
/** A line only when something is signed there. */
function when(wants: Maybe, draft: Omit<Draft, 'wants'>): Draft[] {
  return wants === undefined || wants === '' ? [] : [{ ...draft, wants }];
}

function sizeOf(point: ReliefPoint): string | undefined {
  const [inlet, outlet] = [point.inlet?.nominal, point.outlet?.nominal];
  return inlet && outlet ? `${inlet} x ${outlet}` : (inlet ?? outlet);
}

function plate(point: ReliefPoint): Draft[] {
  const at = `reliefPoints/${point.id}`;
  const group = 'nameplate';
  const letter = point.orifice.letter;
  const area = quantityOf(point.orifice.actual) ?? quantityOf(point.orifice.effective);
  return [
    ...when(point.maker, { at: `${at}/maker`, group, label: 'Maker' }),
    ...when(point.model, { at: `${at}/model`, group, label: 'Model' }),
    ...when(quantityOf(point.set), { at: `${at}/set`, group, label: 'Set pressure', photo: true }),
    ...when(quantityOf(point.setVacuum), { at: `${at}/setVacuum`, group, label: 'Set vacuum', photo: true }),
    ...when(quantityOf(point.cdtp), {
      at: `${at}/cdtp`,
      group,
      label: 'Cold differential test pressure (CDTP)',
      photo: true,
    }),
    ...when(quantityOf(point.disk?.burst), {
      at: `${at}/disk/burst`,
      group,
      label: 'Marked burst pressure',
      photo: true,
    }),
    ...when(point.disk?.lot, { at: `${at}/disk/lot`, group, label: 'Lot of the disk' }),
    ...(letter
      ? when(letter, { at: `${at}/orifice/letter`, group, label: 'Orifice letter' })
      : when(area, { at: `${at}/orifice/actual`, group, label: 'Flow area' })),
    ...when(sizeOf(point), { at: `${at}/inlet`, group, label: 'Connections, inlet and outlet' }),
    ...when(quantityOf(point.capacity?.of), {
      at: `${at}/capacity/of`,
      group,
      label: `Certified capacity, ${point.capacity?.medium ?? ''}`,
    }),
  ];
}

function shop(point: ReliefPoint): Draft[] {
  const at = `reliefPoints/${point.id}`;
  const left = quantityOf(point.cdtp) ?? quantityOf(point.set);
  return [
    {
      at: `${at}#certificate`,
      group: 'certificate',
      label: 'Serial number on the test certificate',
      wants: 'same as plate',
      photo: true,
    },
    ...when(left, {
      at: `${at}#as-left`,
      group: 'certificate',
      label: 'Opening pressure as left by the shop',
    }),
    { at: `${at}#seals`, group: 'seals', label: 'Seals of cap and adjustment', wants: 'intact', photo: true },
  ];
}

function isolation(valve: Isolation): Draft[] {
  const at = `isolations/${valve.id}`;
  const name = `${valve.tag ?? 'Isolation valve'}, ${valve.where}`;
  const locked = valve.lock && valve.lock.kind !== 'none';
  return [
    ...when(valve.kept === 'either' ? undefined : valve.kept, {
      at: `${at}/kept`,
      group: 'isolation',
      label: `${name}: position`,
      photo: true,
    }),
    ...when(locked ? valve.lock?.number : undefined, {
      at: `${at}/lock/number`,
      group: 'isolation',
      label: `${name}: number of the ${valve.lock?.kind ?? 'lock'}`,
      photo: true,
    }),
    ...when(valve.stem, { at: `${at}/stem`, group: 'isolation', label: `${name}: position of the stem` }),
  ];
}

function around(point: ReliefPoint, basis: Basis): Draft[] {
  const at = `reliefPoints/${point.id}`;
  const lines = basis.lines.filter((line) => line.point === point.id);
  const outlet = lines.find((line) => line.side === 'outlet');
  const end = outlet?.end;
  const transport = 'Gag, plugs, flange covers, lifting blocks, test blinds';
  return [
    ...when(point.bonnet?.vent, {
      at: `${at}/bonnet/vent`,
      group: 'bonnet',
      label: 'Bonnet vent',
      photo: true,
    }),
    ...when(point.bonnet?.plug, { at: `${at}/bonnet/plug`, group: 'bonnet', label: 'Bonnet plug' }),
    { at: `${at}#transport`, group: 'transport', label: transport, wants: 'removed', photo: true },
    ...lines.map((line) => ({
      at: `lines/${line.id}#drawn`,
      group: 'piping',
      label: `${line.side === 'inlet' ? 'Inlet' : 'Outlet'} line: bore, length, fittings, supports`,
      wants: 'as drawn',
    })),
    ...when(end?.location ?? end?.to, {
      at: `lines/${outlet?.id ?? ''}/end/location`,
      group: 'discharge',
      label: 'Where it discharges',
    }),
    ...when(end ? 'clear' : undefined, {
      at: `${at}#discharge`,
      group: 'discharge',
      label: 'Discharge and the places near it',
      photo: true,
    }),
  ];
}

/** The lines of one relief point in walking order: plate, certificate, seals, valves, bonnet, lines, discharge. */
export function pointLines(point: ReliefPoint, basis: Basis): Draft[] {
  const at = `reliefPoints/${point.id}`;
  return [
    { at: `${at}/tag`, group: 'identity', label: 'Tag plate', wants: point.tag, photo: true },
    { at: `${at}#serial`, group: 'identity', label: 'Serial number on the plate', photo: true },
    ...when(point.service, { at: `${at}/service`, group: 'identity', label: 'In service or spare' }),
    ...plate(point),
    ...shop(point),
    ...basis.isolations.filter((valve) => valve.protects.includes(point.id)).flatMap(isolation),
    ...around(point, basis),
  ];
}
