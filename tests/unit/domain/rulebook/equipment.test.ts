/* Rules on equipment (section A). */
import { richFromText } from '@domain/basis';
import { equipment, first, fluid, group, heatAnswer, point, q, scenario, side, tryRules } from './kit';
import { column } from '../../../fixtures/basis';

tryRules('A. Equipment', [
  {
    code: 'mawp-missing',
    source: '46 CFR 54.10-5: MAWP goes with a designated temperature',
    fires: (b) => delete first(side(b).ratings).at,
    says: 'C-1 has no MAWP or design pressure',
  },
  {
    code: 'mawp-not-governing',
    // 678 kg/m³ · 9.80665 · 20 m = 1.33 bar of static head on the lowest liquid-filled point: 3.5 − 1.33 = 2.17 barg.
    source: 'ASME VIII-1 UG-98: at the top of the vessel, less static head (from memory)',
    both: (b) => {
      fluid(b).rhoLiquid = q(678, 'kg/m3');
      point(b).on = { equipment: 'eq_c1', elevation: q(24.2, 'm') };
      equipment(b).elevation = q(4.2, 'm');
    },
    fires: (b) => void (heatAnswer(b).liquidFull = true),
    says: 'PSV-1 is judged against C-1, but C-1 governs',
  },
  {
    code: 'mawp-not-governing',
    source: 'the weakest of the parts that the group covers',
    fires: (b) => {
      const weaker = { ...column(), id: 'eq_v1', tag: 'V-1' };
      weaker.sides = weaker.sides.map((one) => ({
        ...one,
        ratings: [{ id: 'rt_1', mawp: q(3.4, 'bar_g'), at: q(185, 'degC') }],
      }));
      b.equipment.push(weaker);
      group(b).covers.push({ id: 'cv_2', equipment: 'eq_v1' });
    },
    says: 'but V-1 governs',
    quiet: (b) => {
      b.equipment.push({ ...column(), id: 'eq_v1', tag: 'V-1' });
      group(b).covers.push({ id: 'cv_2', equipment: 'eq_v1' });
    },
  },
  {
    code: 'mawp-temperature-exceeded',
    source: 'design 185 °C; more than 1 K above fires',
    fires: (b) => void (heatAnswer(b).T = q(187, 'degC')),
    says: 'C-1 reaches 187 °C, above the 185 °C',
    quiet: (b) => void (heatAnswer(b).T = q(186, 'degC')),
  },
  {
    code: 'mawp-raised-without-rerate',
    source: 'API 510 section 7, re-rating (from memory)',
    changed: true,
    fires: (b) => void (first(side(b).ratings).mawp = q(4, 'bar_g')),
    says: 'is higher than in the basis in force',
    quiet: (b) => {
      first(side(b).ratings).mawp = q(4, 'bar_g');
      b.references.push({ id: 're_2', title: 'Re-rating of C-1', names: ['C-1'], kind: 'rerate' });
    },
  },
  {
    code: 'vacuum-unprotected',
    source: 'external rating 20 kPa against a vacuum of 30 kPa',
    both: (b) => {
      const vacuum = scenario(b, 'vacuum');
      vacuum.disposition = 'credible';
      vacuum.answers = [{ ...heatAnswer(b), id: 'an_v', lowest: q(-30, 'kPa_g') }];
    },
    fires: (b) => void (side(b).external = q(20, 'kPa')),
    says: 'can pull C-1 to −30 kPag, and its external rating is 20 kPa',
    quiet: (b) => void (side(b).external = q(30, 'kPa')),
  },
  {
    code: 'vacuum-unprotected',
    source: 'set aside as rated for full vacuum, with a rating of 50 kPa below the barometer of 101.3 kPa',
    both: (b) =>
      void (scenario(b, 'vacuum').reason = richFromText(
        'C-1 is rated for full vacuum by drawing 101-D-010 rev 4.',
      )),
    fires: (b) => void (side(b).external = q(50, 'kPa')),
  },
  {
    code: 'equipment-unprotected',
    source: 'ASME VIII-1 2019 UG-125(a), UG-140',
    fires: (b) => void b.equipment.push({ ...column(), id: 'eq_v1', tag: 'V-1' }),
    says: 'V-1 has no device',
    quiet: (b) =>
      void b.equipment.push({
        ...column(),
        id: 'eq_v1',
        tag: 'V-1',
        // UG-140: the source at 3.4 barg can't pass the MAWP of 3.5 barg, with an analysis and an acceptance.
        noDevice: {
          reason: 'system-design',
          text: richFromText('Limited by the source.'),
          sourceMax: q(3.4, 'bar_g'),
          analysis: 're_1',
          acceptedBy: 'pe_1',
        },
      }),
  },
  {
    code: 'boundary-valve-unregistered',
    source: 'one valve on the drawing, none in the list',
    fires: (b) => void (first(b.boundary.paths).valvesOnDrawing = 1),
    says: 'separate C-1 from PSV-1',
    quiet: (b) => {
      first(b.boundary.paths).valvesOnDrawing = 1;
      b.isolations.push({
        id: 'is_1',
        where: 'inlet',
        protects: ['rp_1'],
        kind: 'gate',
        kept: 'open',
        lock: { kind: 'lock', number: 'L-1', keeper: 'Shift' },
      });
    },
  },
]);
