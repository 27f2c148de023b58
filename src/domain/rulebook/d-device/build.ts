/* Rules on how a device is built: restricted lift, pilot, certified capacity. */
import { quantityOf } from '@domain/basis';
import { toSI } from '@engine/quantity';
import { fluidOf, answersOfPoint, onPoint } from '../reading';
import { type Hit, rule } from '../types';

const LEAST_LIFT_SHARE = 0.3;
const LEAST_LIFT = 0.002;

export const reducedLiftMisused = rule(
  {
    code: 'reduced-lift-misused',
    subject: 'device',
    statement: 'The capacity of {device} is taken at full lift although its lift is {lift}.',
    condition:
      'The lift is low or restricted and the sheet uses the area or capacity of full lift; or the restricted lift is below 30 % of full or below 2 mm (0.080 in); or it was restricted by others than the maker or an authorised shop with a plate.',
    severity: 'stop',
    gate: 'scenarios',
    source: 'ASME VIII-1 UG-133(h) [S], UG-136(a)(11) [S]',
  },
  (ctx) =>
    ctx.doc.reliefPoints.flatMap((point): Hit[] => {
      if (point.axes.lift !== 'restricted') return [];
      const lift = quantityOf(point.orifice.lift);
      const full = quantityOf(point.orifice.fullLift);
      const small =
        lift !== undefined &&
        (toSI(lift) < LEAST_LIFT * 0.999 ||
          (full !== undefined && toSI(lift) < LEAST_LIFT_SHARE * toSI(full) * 0.999));
      const unmarked = point.orifice.restrictedBy === 'other' || point.orifice.restrictionOnPlate !== true;
      return small || unmarked
        ? [onPoint(point, { lift: lift ?? 'restricted' }, { field: `reliefPoints/${point.id}/orifice` })]
        : [];
    }),
);

export const pilotUnfit = rule(
  {
    code: 'pilot-unfit',
    subject: 'device',
    statement: '{device} is pilot-operated in {service}, which can block or damage the pilot.',
    condition:
      'A pilot stands in service with solids, wax, polymer, hydrate or freezing, or outside the temperatures of its soft goods (−29 to 204 °C unless stated), and has no filter, heat tracing, purge, remote clean sensing or maker’s statement.',
    severity: 'justify',
    gate: 'scenarios',
    source: 'API 520-1 [M]',
  },
  (ctx) =>
    ctx.doc.reliefPoints.flatMap((point): Hit[] => {
      if (!point.axes.actuation.includes('pilot')) return [];
      const { pilot } = point;
      const kept =
        pilot?.filter === true ||
        pilot?.tracing === true ||
        pilot?.purge === true ||
        pilot?.sensing === 'remote' ||
        pilot?.makerSays !== undefined;
      const fouling = answersOfPoint(ctx, point)
        .flatMap((ca) => fluidOf(ctx, ca) ?? [])
        .find(({ hazards }) =>
          [hazards?.solids, hazards?.wax, hazards?.polymer, hazards?.hydrate, hazards?.freezing].includes(
            true,
          ),
        );
      return fouling && !kept
        ? [onPoint(point, { service: fouling.name }, { field: `reliefPoints/${point.id}/pilot` })]
        : [];
    }),
);

export const certificationMissing = rule(
  {
    code: 'certification-missing',
    subject: 'device',
    statement: '{device} has no certified capacity for the code basis of this site.',
    condition:
      'The mark or certificate is missing (ASME UV or UD, or its successor under XIII; CE or UKCA category IV). A new or changed device is stopped; one that stands unchanged asks for a reason.',
    severity: 'stop',
    gate: 'scenarios',
    source: 'ASME VIII-1 UG-129/131, XIII (2021+) [M]; PED 2.11 [M]',
  },
  (ctx) =>
    ctx.doc.reliefPoints.flatMap((point): Hit[] => {
      if (point.mark?.code !== undefined || point.mark?.certificate !== undefined) return [];
      const before = ctx.prior?.doc.reliefPoints.find((other) => other.id === point.id);
      const same = before !== undefined && before.maker === point.maker && before.model === point.model;
      return [
        onPoint(
          point,
          {},
          { field: `reliefPoints/${point.id}/mark`, ...(same ? { severity: 'note' as const } : {}) },
        ),
      ];
    }),
);
