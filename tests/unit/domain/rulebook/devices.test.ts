/* Rules on devices: back pressure, suitability, disks, bonnet (sections D, E and J). */
import { type ReliefPoint } from '@domain/basis';
import { fluid, group, heatAnswer, lineSheet, point, q, second, side, tryRules, type Change } from './kit';
import { first, valve } from '../../../fixtures/basis';

const builtUp =
  (bar: number): Change =>
  (b) =>
    lineSheet(b, 'outlet', { built_up_back_pressure: q(bar, 'bar') });
const total =
  (bar: number): Change =>
  (b) =>
    lineSheet(b, 'outlet', { total_back_pressure: q(bar, 'bar_g') });

tryRules('D. Suitability', [
  // Overpressure 10 % of 3.5 barg = 0.35 bar.
  {
    code: 'conventional-built-up-high',
    source: 'API 520-1 10th ed. 5.3 (from memory)',
    fires: builtUp(0.36),
    says: 'Built-up back pressure on PSV-1 is 10.3 % of set, more than its overpressure of 10 %',
    quiet: builtUp(0.35),
  },
  {
    code: 'superimposed-variable',
    // 3.5 + (0.2 − 0.1) = 3.6 barg, above the MAWP of 3.5 barg; a constant back pressure is in the cold setting.
    source: 'API 520-1 (from memory)',
    fires: (b) => void (point(b).superimposed = { min: q(0.1, 'bar_g'), max: q(0.2, 'bar_g') }),
    says: 'delays the opening of PSV-1 to 3.6 barg',
    quiet: (b) => void (point(b).superimposed = { min: q(0.1, 'bar_g'), max: q(0.1, 'bar_g') }),
  },
  {
    code: 'balanced-total-high',
    source: '50 % of set for new designs, public owner practice: 1.75 of 3.5 barg',
    both: (b) => void (point(b).axes.balance = 'bellows'),
    fires: total(1.8),
    says: 'Total back pressure on balanced PSV-1 is 51.4 % of set, beyond 50 %',
    quiet: total(1.75),
  },
  {
    code: 'trim-does-not-suit-state',
    source: 'ASME VIII-1 UG-125(f): liquid needs a device for liquid',
    fires: (b) => void (fluid(b).phase = 'liquid'),
    says: 'PSV-1 is certified for gas and steam but Abnormal heat or vapour input relieves liquid',
    quiet: (b) => {
      fluid(b).phase = 'liquid';
      point(b).axes.certifiedFor = ['gas', 'liquid'];
    },
  },
  {
    code: 'trim-does-not-suit-state',
    source: 'two-phase: say why it is stable',
    fires: (b) => void (fluid(b).phase = 'two-phase'),
    severity: 'justify',
    says: 'State why it stays stable',
  },
  {
    code: 'open-bonnet-unfit',
    source: 'API 520-1 (from memory)',
    fires: (b) => void (point(b).bonnet = { kind: 'open' }),
    says: 'PSV-1 has an open bonnet or plain lever and can release Acetone vapour',
    quiet: (b) => {
      point(b).bonnet = { kind: 'open' };
      fluid(b).hazards = {};
    },
  },
  {
    code: 'actuated-device-alone',
    source: 'ASME VIII-1 UG-125(g)',
    fires: (b) => void (point(b).axes.actuation = ['power']),
    says: 'PSV-1 needs outside power or acts on temperature',
    quiet: (b) => {
      point(b).axes.actuation = ['power'];
      second(b, { set: q(3.6, 'bar_g') });
    },
  },
  {
    code: 'non-reclosing-alone',
    source: 'SPS 341 Appendix C, note on non-reclosing devices',
    fires: (b) => void (point(b).axes.recloses = 'disk'),
    says: 'PSV-1 does not reclose',
    quiet: (b) => {
      point(b).axes.recloses = 'disk';
      fluid(b).hazards = {};
    },
  },
  {
    code: 'reduced-lift-misused',
    source: 'UG-136(a)(11): not below 30 % of full lift nor 2 mm (0.080 in)',
    both: (b) => void (point(b).axes.lift = 'restricted'),
    fires: (b) =>
      void (point(b).orifice = {
        ...point(b).orifice,
        lift: q(2, 'mm'),
        fullLift: q(7, 'mm'),
        restrictedBy: 'maker',
        restrictionOnPlate: true,
      }),
    says: 'its lift is 2 mm',
    quiet: (b) =>
      void (point(b).orifice = {
        ...point(b).orifice,
        lift: q(3, 'mm'),
        fullLift: q(7, 'mm'),
        restrictedBy: 'maker',
        restrictionOnPlate: true,
      }),
  },
  {
    code: 'pilot-unfit',
    source: 'API 520-1 (from memory)',
    both: (b) => {
      point(b).axes.actuation = ['pilot'];
      fluid(b).hazards = { polymer: true };
    },
    fires: (b) => void (point(b).pilot = { sensing: 'at-valve' }),
    quiet: (b) => void (point(b).pilot = { sensing: 'at-valve', filter: true }),
  },
  {
    code: 'certification-missing',
    source: 'ASME VIII-1 UG-129, UG-131 (from memory)',
    fires: (b) => delete point(b).mark,
    says: 'PSV-1 has no certified capacity',
  },
  {
    code: 'bonnet-vent-wrong',
    source: 'SPS 341 Appendix C UG-127: vent the bonnet of a balanced valve',
    both: (b) => void (point(b).axes.balance = 'bellows'),
    fires: (b) => void (point(b).bonnet = { kind: 'vented', vent: 'plugged' }),
    says: 'The bonnet vent of PSV-1 is plugged',
    quiet: (b) => void (point(b).bonnet = { kind: 'vented', vent: 'piped' }),
  },
]);

/** Makes the first device a plain disk with this burst pressure. */
const disk =
  (bar: number, more: Partial<NonNullable<ReliefPoint['disk']>> = {}): Change =>
  (b) => {
    const one = point(b);
    one.axes = { ...one.axes, recloses: 'disk', holds: 'element' };
    one.disk = { type: 'plain', burst: q(bar, 'bar_g'), ...more };
    delete one.set;
  };

/** Puts a disk of its own below the first valve. */
const below =
  (
    bar: number,
    more: Partial<NonNullable<ReliefPoint['with']>> = {},
    made: Partial<NonNullable<ReliefPoint['disk']>> = {},
  ): Change =>
  (b) => {
    point(b).with = { disk: 'rp_d', side: 'inlet', space: 'gauge', ...more };
    point(b).inlet = { bore: q(100, 'mm') };
    point(b).k = { ...point(b).k, kc: q(0.9, '-') };
    const own = valve();
    b.reliefPoints.push({
      ...own,
      id: 'rp_d',
      tag: 'RD-1',
      purpose: 'shields-a-valve',
      axes: { ...own.axes, recloses: 'disk', holds: 'element' },
      disk: { burst: q(bar, 'bar_g'), netArea: q(8000, 'mm2'), ...made },
    });
  };

tryRules('E. Rupture disks', [
  // Top of a 10 % range: 3.4 · 1.05 = 3.57 barg, above 3.5 barg.
  {
    code: 'disk-burst-above-limit',
    source: 'ASME VIII-1 UG-127(a)(1)',
    fires: disk(3.4, { range: q(0.1, '-') }),
    says: 'marked to burst at 3.57 barg, above its limit 3.5 barg',
    quiet: disk(3.4, { range: q(0.05, '-') }),
  },
  {
    code: 'disk-operating-ratio',
    // Lowest burst 3.5 barg − 5 % = 3.325 barg; 70 % of it is 2.33 barg.
    source: 'ASME VIII-1 2015 UG-134(e); 70 % for a plain disk',
    fires: (b) => {
      disk(3.5)(b);
      side(b).operating = { max: q(2.4, 'bar_g') };
    },
    says: 'C-1 operates at 72.2 %',
    quiet: (b) => {
      disk(3.5)(b);
      side(b).operating = { max: q(2.3, 'bar_g') };
    },
  },
  {
    code: 'disk-combination-factor',
    source: '0.9 without a certified pair',
    fires: (b) => {
      below(3.5)(b);
      point(b).k = { kc: q(0.95, '-') };
    },
    says: 'sized with Kc = 0.95',
    quiet: below(3.5),
  },
  {
    code: 'disk-space-unmonitored',
    source: 'ASME VIII-1 UG-127(a)(3)(b) (from memory)',
    fires: below(3.5, { space: 'none' }),
    says: 'between the disk and PSV-1',
    quiet: below(3.5),
  },
  // Bore 100 mm: 7 854 mm² of inlet.
  {
    code: 'disk-obstructs-valve',
    source: 'ASME VIII-1 UG-127(a)(3) (from memory)',
    fires: below(3.5, {}, { netArea: q(7000, 'mm2') }),
    quiet: below(3.5),
  },
  // 90 % of 3.5 barg = 3.15 barg.
  {
    code: 'disk-valve-pressure-gap',
    source: '90 to 110 %, ASME VIII-1 UG-132 (from memory)',
    fires: below(3.1),
    says: 'The disk bursts at 3.1 barg and the valve is set at 3.5 barg',
    quiet: below(3.2),
  },
  {
    code: 'correction-factor-missing',
    source: 'Kc = 1 with a disk below the valve',
    fires: (b) => {
      below(3.5)(b);
      heatAnswer(b).size = { by: 'method', method: 'a.gas', inputs: { Kc: q(1, '-') } };
    },
    says: 'Kc is left at 1 although a disk stands below PSV-1',
    quiet: below(3.5),
  },
  {
    code: 'spare-credited',
    source: 'ASME VIII-1 2015 UG-135(d)(1)',
    fires: (b) => void (first(group(b).members).place = 'spare'),
    says: 'PSV-1 is an installed spare',
  },
]);
