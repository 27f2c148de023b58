/* Rules on entered figures and on what was taken from elsewhere (sections P and Q). */
import { type Basis, type Origin } from '@domain/basis';
import { externalInputsHash } from '@domain/evaluate';
import { first, fluid, heatAnswer, point, q, scenario, side, tryRules, type Change } from './kit';

const SHEET: Origin = { kind: 'data-sheet', ref: 'DS-101 rev 3' };
const latent =
  (value: number, origin?: Origin): Change =>
  (b) =>
    void (fluid(b).latentHeat = { value, unit: 'kJ/kg', ...(origin ? { origin } : {}) });

tryRules('P. Figures', [
  {
    code: 'value-impossible',
    source: 'latent heat 1 to 2 600 kJ/kg',
    fires: latent(3000, SHEET),
    says: 'latent heat = 3',
    quiet: latent(2000, SHEET),
  },
  {
    code: 'value-impossible',
    source: 'test pressure at or above MAWP',
    fires: (b) => void (side(b).test = q(3, 'bar_g')),
    says: 'It is at least the MAWP',
    quiet: (b) => void (side(b).test = q(3.5, 'bar_g')),
  },
  {
    code: 'value-impossible',
    source: 'MDMT below the design temperature of 185 °C',
    fires: (b) => void (side(b).mdmt = q(90, 'degC')),
    quiet: (b) => void (side(b).mdmt = q(40, 'degC')),
    both: (b) => void (first(side(b).ratings).at = q(80, 'degC')),
  },
  {
    code: 'value-impossible',
    source: 'API 526: letter L has 1 841 mm² ± 0.5 %',
    fires: (b) => void (point(b).orifice.effective = q(1855, 'mm2')),
    says: 'Letter L has 1841 mm²',
    quiet: (b) => void (point(b).orifice.effective = q(1845, 'mm2')),
  },
  {
    code: 'value-impossible',
    source: 'least superimposed back pressure above the greatest',
    fires: (b) => void (point(b).superimposed = { min: q(0.3, 'bar_g'), max: q(0.2, 'bar_g') }),
    quiet: (b) => void (point(b).superimposed = { min: q(0.2, 'bar_g'), max: q(0.3, 'bar_g') }),
  },
  // 80 to 2 300 kJ/kg are usual; an origin of its own, other than a judgement, confirms.
  {
    code: 'value-implausible',
    source: 'latent heat mostly 80 to 2 300 kJ/kg',
    fires: latent(70),
    says: 'is unusual: confirm or correct',
    quiet: latent(70, SHEET),
  },
  {
    code: 'unit-slip-suspected',
    source: '430 kJ/kg → 62.4: divided by 6.895',
    changed: true,
    fires: latent(62.4, SHEET),
    says: 'close to a unit mix-up',
    quiet: latent(80, SHEET),
  },
  {
    code: 'origin-missing',
    source: 'a changed figure needs its own origin',
    changed: true,
    fires: latent(400),
    says: 'was changed and does not say where it comes from',
    quiet: latent(400, SHEET),
  },
  {
    code: 'origin-missing',
    source: "or a changed owner's",
    changed: true,
    fires: (b) => void (first(b.equipment).elevation = q(5, 'm')),
    quiet: (b) => {
      first(b.equipment).elevation = q(5, 'm');
      first(b.equipment).origin = { kind: 'drawing', ref: 'Drawing 101-D-010 rev 5' };
    },
  },
]);

const copied =
  (taken: number): Change =>
  (b) => {
    const origin: Origin = {
      kind: 'figure',
      ref: 'SYS-9',
      figure: { doc: 'this', path: 'reliefPoints/rp_1/set', taken: q(taken, 'bar_g') },
    };
    b.sources.push({
      id: 'so_1',
      tag: 'PV-1',
      kind: 'regulator',
      pressure: { ...q(4.5, 'bar_abs'), origin },
    });
  };

/** Below the limit by the pressure of a source, taken when it was 3.0 barg. */
const bounded =
  (now: number, most = 3.5): Change =>
  (b: Basis) => {
    first(side(b).ratings).mawp = q(most, 'bar_g');
    b.sources.push({ id: 'so_1', tag: 'P-7', kind: 'feed', pressure: q(now, 'bar_g') });
    Object.assign(scenario(b, 'vacuum'), {
      disposition: 'below-limit',
      bound: {
        figure: { use: 'sources/so_1/pressure' },
        live: { doc: 'this', path: 'sources/so_1/pressure', taken: q(3, 'bar_g') },
        limit: { equipment: 'eq_c1', side: 'sd_c1', of: 'mawp' },
      },
    });
  };

const external =
  (change: Change): Change =>
  (b) => {
    b.externalSheets.push({
      id: 'xs_1',
      about: 'load',
      title: 'Boil-up',
      author: 'A. Person',
      method: 'spreadsheet',
      inputs: { duty: { use: 'fluids/fl_v/latentHeat' } },
      figures: {},
    });
    const sheet = first(b.externalSheets);
    sheet.madeOf = externalInputsHash(b, sheet);
    change(b);
  };

tryRules('Q. Staleness', [
  {
    code: 'copied-figure-stale',
    source: 'beyond 0.1 % of the value taken',
    fires: copied(3.4),
    says: 'was taken from SYS-9 and has moved there from 3.4 barg to 3.5 barg',
    quiet: copied(3.502),
  },
  {
    code: 'below-limit-bound-stale',
    source: 'the live bound moved',
    fires: bounded(3.2),
    says: 'is 3 barg; it is now 3.2 barg',
    quiet: bounded(3),
  },
  {
    code: 'below-limit-bound-stale',
    source: 'the bound passes the limit of 2.9 barg',
    fires: bounded(3, 2.9),
    says: 'It passes the limit',
    quiet: bounded(3),
  },
  {
    code: 'external-sheet-stale',
    source: 'hash of its inputs',
    fires: external(latent(500, SHEET)),
    says: 'was made for other inputs',
    quiet: external(() => undefined),
  },
  {
    code: 'calculation-unsound',
    source: 'Re below 80 leaves the 10th edition formula of Kv',
    fires: (b) => {
      fluid(b).phase = 'liquid';
      fluid(b).muLiquid = q(200_000, 'cP');
      heatAnswer(b).size = { by: 'method', method: 'c.liquid', inputs: {} };
    },
    says: 'Re above 80',
  },
]);
