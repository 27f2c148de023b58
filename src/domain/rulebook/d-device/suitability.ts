/* Rules on whether a kind of device suits the state and the service that it relieves. */
import { type Fluid, type ReliefPoint, quantityOf } from '@domain/basis';
import { type CredibleAnswer, outletOf } from '@domain/evaluate';
import { fluidOf, answersOfPoint, gaugePa, onPoint, scenarioName } from '../reading';
import { type Hit, rule, type RuleContext, type Severity } from '../types';

type Misfit = { state: string; severity?: Severity; more?: string };

/** What a device is certified for that does not suit the state of an answer; nothing when it suits. */
function misfit(point: ReliefPoint, fluid: Fluid, ca: CredibleAnswer): Misfit | undefined {
  const certified = new Set(point.axes.certifiedFor);
  const liquid = certified.has('liquid');
  const compressible = certified.has('gas') || certified.has('steam');
  const nonCertified = ca.answer.size.by === 'method' && ca.answer.size.method === 'c.liquid-noncertified';
  if (fluid.phase === 'liquid' && !liquid && !nonCertified) return { state: 'liquid' };
  if ((fluid.phase === 'gas' || fluid.phase === 'vapour') && !compressible) return { state: fluid.phase };
  const mixed = fluid.phase === 'two-phase' || fluid.phase === 'flashing-liquid';
  if (!mixed || (liquid && compressible)) return undefined;
  return { state: fluid.phase.replace('-', ' '), severity: 'justify', more: 'State why it stays stable.' };
}

export const trimDoesNotSuitState = rule(
  {
    code: 'trim-does-not-suit-state',
    subject: 'device',
    statement: '{device} is certified for {cert} but {scenario} relieves {state}.',
    condition:
      'The scenario passes liquid, or liquid first, through a device not certified for liquid, and the sheet is not the one for valves without liquid certificate; or gas or steam through one not certified for it; or liquid through a pop valve; or two phases or flashing liquid through one not certified for both, without a word on why it is stable.',
    severity: 'stop',
    gate: 'scenarios',
    source: 'ASME VIII-1 UG-125(f): liquid-full vessels need devices for liquid [S]; API 520-1 [M]',
  },
  (ctx) =>
    ctx.doc.reliefPoints
      .filter((point) => point.axes.recloses === 'yes' && point.axes.certifiedFor.length > 0)
      .flatMap((point) =>
        answersOfPoint(ctx, point).flatMap((ca): Hit[] => {
          const fluid = fluidOf(ctx, ca);
          const wrong = fluid && misfit(point, fluid, ca);
          if (!wrong) return [];
          const { state, ...extra } = wrong;
          const values = {
            cert: point.axes.certifiedFor.join(' and '),
            scenario: scenarioName(ca.scenario),
            state,
          };
          return [onPoint(point, values, { ...extra, field: `reliefPoints/${point.id}/axes/certifiedFor` })];
        }),
      ),
);

/** The first hazardous fluid that a device relieves. */
function hazardous(ctx: RuleContext, point: ReliefPoint): Fluid | undefined {
  return answersOfPoint(ctx, point)
    .flatMap((ca) => fluidOf(ctx, ca) ?? [])
    .find((fluid) => fluid.hazards?.toxic === true || fluid.hazards?.flammable === true);
}

export const openBonnetUnfit = rule(
  {
    code: 'open-bonnet-unfit',
    subject: 'device',
    statement: '{device} has an open bonnet or plain lever and can release {fluid} at the valve.',
    condition:
      'Open bonnet or yoke, or an unpacked lever, with a toxic or flammable fluid, or with an outlet to a closed system under superimposed pressure.',
    severity: 'stop',
    gate: 'scenarios',
    source: 'API 520-1 [M]',
  },
  (ctx) =>
    ctx.doc.reliefPoints.flatMap((point): Hit[] => {
      if (point.bonnet?.kind !== 'open' && point.bonnet?.lever !== 'plain') return [];
      const fluid = hazardous(ctx, point);
      const most = quantityOf(point.superimposed?.max);
      const closed =
        outletOf({ basis: ctx.doc }, point)?.end?.to === 'header' &&
        most !== undefined &&
        gaugePa(ctx, most) > 0;
      if (!fluid && !closed) return [];
      const named = fluid ?? answersOfPoint(ctx, point).flatMap((ca) => fluidOf(ctx, ca) ?? [])[0];
      return [
        onPoint(
          point,
          { fluid: named?.name ?? 'what the header holds' },
          { field: `reliefPoints/${point.id}/bonnet` },
        ),
      ];
    }),
);

function isActuated(point: ReliefPoint): boolean {
  return point.axes.actuation.includes('power') || point.axes.actuation.includes('temperature');
}

function excepted(ctx: RuleContext, point: ReliefPoint): boolean {
  const listed = point.power?.listed;
  if (listed === 'controlled-system')
    return ctx.rules.parameters['allowControlledSystem'] === true && point.power?.certificate !== undefined;
  return listed !== undefined;
}

export const actuatedDeviceAlone = rule(
  {
    code: 'actuated-device-alone',
    subject: 'device',
    statement: '{device} needs outside power or acts on temperature, and {scenario} has no other device.',
    condition:
      'A device that works by outside power or by temperature alone answers a credible scenario. Excepted by code basis: certified controlled safety systems, steam generators to ASME I, listed temperature-and-pressure valves on hot-water storage.',
    severity: 'stop',
    gate: 'scenarios',
    source:
      'ASME VIII-1 UG-125(g) note: control instruments are not positive enough [S]; 46 CFR 54.15-10(b) pilot must open on failure [S]; ISO 4126-5 scope [S]',
    parameter: 'allowControlledSystem',
  },
  (ctx) =>
    ctx.answers.flatMap((ca): Hit[] => {
      const members = (ca.group?.members ?? []).flatMap((member) => {
        const point = ctx.lookup.points.get(member.point);
        return point && member.credited && point.service === 'in-service' ? [point] : [];
      });
      const [first] = members;
      if (!first || !members.every((point) => isActuated(point) && !excepted(ctx, point))) return [];
      return [
        onPoint(first, { scenario: scenarioName(ca.scenario) }, { field: `groups/${ca.group?.id ?? ''}` }),
      ];
    }),
);

export const nonReclosingAlone = rule(
  {
    code: 'non-reclosing-alone',
    subject: 'device',
    statement: '{device} does not reclose: after it acts, {inventory} of {fluid} is lost.',
    condition: 'A rupture disk or pin acts alone and the fluid is toxic, flammable or liquefied.',
    severity: 'justify',
    gate: 'scenarios',
    source: 'SPS 341 App. C note on non-reclosing devices [S]; [P]',
  },
  (ctx) =>
    ctx.doc.reliefPoints.flatMap((point): Hit[] => {
      if (
        point.axes.recloses === 'yes' ||
        point.purpose === 'shields-a-valve' ||
        point.service !== 'in-service'
      )
        return [];
      const shields = ctx.doc.reliefPoints.some((other) => other.with?.disk === point.id);
      const lost = answersOfPoint(ctx, point)
        .flatMap((ca) => fluidOf(ctx, ca) ?? [])
        .find(
          (fluid) =>
            fluid.hazards?.toxic === true ||
            fluid.hazards?.flammable === true ||
            fluid.hazards?.liquefied === true,
        );
      if (shields || !lost) return [];
      const held = quantityOf(ctx.lookup.equipment.get(point.on?.equipment ?? '')?.inventory);
      return [onPoint(point, { inventory: held ?? 'the content', fluid: lost.name })];
    }),
);
