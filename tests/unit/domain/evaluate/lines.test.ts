/* Lines of the small basis: the flow they carry, the back pressure that it makes, and where a sheet made elsewhere stands instead. */
import { describe, expect, it } from 'vitest';
import { type Basis, type Line, type Segment } from '@domain/basis';
import { type ImportSet } from '@domain/evaluate';
import { adiabaticLine, frictionFactor, isothermalLine, reynolds } from '@engine/lines';
import { type Q, toSI } from '@engine/quantity';
import { basisWith, evaluated, first } from '../../../fixtures/basis';

const q = (value: number, unit: string) => ({
  value,
  unit,
  origin: { kind: 'drawing' as const, ref: 'Drawing 101-L-1 rev 1' },
});

function segment(id: string, bore: number, length: number, K: number): Segment {
  return {
    id,
    bore: q(bore, 'mm'),
    length: q(length, 'm'),
    roughness: q(0.046, 'mm'),
    fittings: [{ id: 'ft_1', name: 'fittings', count: 1, k: q(K, '-'), by: 'K' }],
  };
}

const inlet: Line = { id: 'ln_in', point: 'rp_1', side: 'inlet', path: ['sg_in'] };
const outlet = (end: Line['end']): Line => ({
  id: 'ln_out',
  point: 'rp_1',
  side: 'outlet',
  path: ['sg_out'],
  end,
});

/** The small basis with an inlet of 4 in and an outlet of 6 in, 20 m; certified data of an L valve. */
function piped(end: Line['end'], change: (basis: Basis) => void = () => undefined): Basis {
  return basisWith((basis) => {
    basis.segments = [segment('sg_in', 102.3, 1, 0.5), segment('sg_out', 154.1, 20, 1.5)];
    basis.lines = [inlet, outlet(end)];
    first(basis.fluids).muVapour = q(0.0098, 'cP');
    const point = first(basis.reliefPoints);
    point.orifice = { ...point.orifice, actual: q(2099, 'mm2') };
    point.k = { ...point.k, gas: q(0.868, '-') };
    change(basis);
  });
}

const out = (sheet: { outputs: Record<string, unknown> } | undefined, name: string): number => {
  const value = sheet?.outputs[name];
  return typeof value === 'object' && value !== null ? toSI(value as Q) : Number.NaN;
};

const GAS = { T: 110 + 273.15, Z: 0.87, M: 58.08, k: 1.1 };
const heads = (W: number, L: number, D: number, K: number) =>
  (frictionFactor(reynolds(W, D, 9.8e-6), 4.6e-5 / D) * L) / D + K;

describe('a relief point with lines', () => {
  it('to the air: adiabatic at the rated flow, with force and noise, and the loss of the inlet', () => {
    const { sheets, points } = evaluated(piped({ to: 'atmosphere' }));
    const W = out(sheets['rated:rp_1'], 'W_rated');
    // K A P1 C √(M/(Z R T)), choked: 0.868 · 2 099 mm² at 4.863 bar abs, worked by the nozzle equation.
    const C = Math.sqrt(1.1 * (2 / 2.1) ** (2.1 / 0.1));
    expect(W / (0.868 * 2099e-6 * 486325 * C * Math.sqrt(58.08 / (0.87 * 8314.462618 * 383.15)))).toBeCloseTo(
      1,
      6,
    );
    const line = [{ D: 0.1541, N: heads(W, 20, 0.1541, 1.5), W }];
    expect(
      out(sheets['outlet:rp_1/own'], 'total_back_pressure') /
        (adiabaticLine(line, GAS, 101325)[0]?.inlet ?? 0),
    ).toBeCloseTo(1, 6);
    const rho = (486325 * 58.08) / (0.87 * 8314.462618 * 383.15);
    const velocity = W / rho / ((Math.PI / 4) * 0.1023 ** 2);
    expect(
      out(sheets['inlet:rp_1'], 'loss') / ((heads(W, 1, 0.1023, 0.5) * rho * velocity ** 2) / 2),
    ).toBeCloseTo(1, 6);
    expect(points['rp_1']?.inletLoss?.unit).toBe('bar');
    expect(sheets['force:rp_1']?.refused).toBeUndefined();
    expect(sheets['noise:rp_1']?.outputs['L30']).toBeDefined();
    expect(sheets['inlet:rp_1']?.inputs['flow_basis']).toBe('rated');
    expect(sheets['outlet:rp_1/own']?.from).toMatchObject({
      W: 'sheets/rated:rp_1#W_rated',
      D: 'segments/sg_out/bore',
      T0: 'fluids/fl_v/T',
    });
  });

  const header: ImportSet = {
    headers: {
      doc_h: {
        revision: 1,
        network: [segment('sg_h', 303.2, 60, 4)],
        normal: { value: 0.01, unit: 'bar_g' },
        causes: {
          cc_low: { at: { value: 1.1, unit: 'bar_abs' }, flow: { value: 1, unit: 'kg/s' } },
          cc_high: { at: { value: 1.4, unit: 'bar_abs' }, flow: { value: 9, unit: 'kg/s' } },
        },
      },
    },
    loads: {},
  };
  const toHeader: Line['end'] = { to: 'header', header: 'doc_h', node: 'nd_1' };

  it('to a header: isothermal to the tip under own relief, Z of one in the header, and from the node in the worst common cause', () => {
    const { sheets, points } = evaluated(piped(toHeader), { imports: header });
    const W = out(sheets['rated:rp_1'], 'W_rated');
    const tail = { D: 0.1541, N: heads(W, 20, 0.1541, 1.5), W };
    const main = { D: 0.3032, N: heads(W, 60, 0.3032, 4), W, Z: 1 };
    const own = isothermalLine([tail, main], GAS, 101325)[0]?.inlet ?? 0;
    const common = isothermalLine([tail], GAS, 140000)[0]?.inlet ?? 0;
    expect(out(sheets['outlet:rp_1/own'], 'total_back_pressure') / own).toBeCloseTo(1, 6);
    expect(out(sheets['outlet:rp_1/cc_high'], 'total_back_pressure') / common).toBeCloseTo(1, 6);
    expect(sheets['outlet:rp_1/cc_low']).toBeUndefined();
    const total = points['rp_1']?.total;
    expect(total && (toSI(total) + 101325) / common).toBeCloseTo(1, 6);
    expect(sheets['force:rp_1']).toBeUndefined();
  });

  it('the required area stands against the outlet that the flow of the scenario makes', () => {
    const { sheets } = evaluated(piped(toHeader), { imports: header });
    const size = sheets['size:abnormal-heat-input/an_1'];
    expect(size?.from['P2']).toBe('lines/ln_out');
    expect(out({ outputs: size?.inputs ?? {} }, 'P2')).toBeGreaterThan(140000);
  });

  it('a narrow outlet pushes back until the flow settles below the relieving pressure', () => {
    const narrow = piped({ to: 'atmosphere' }, (basis) => {
      basis.segments = [first(basis.segments), segment('sg_out', 60, 40, 5)];
    });
    const { sheets } = evaluated(narrow);
    const size = sheets['size:abnormal-heat-input/an_1'];
    expect(size?.refused).toBeUndefined();
    const P2 = out({ outputs: size?.inputs ?? {} }, 'P2');
    expect(P2).toBeGreaterThan(200e3);
    expect(P2).toBeLessThan(486325);
    expect(out(size, 'A_required')).toBeGreaterThan(1534.6e-6);
  });

  it('says which figure of the fluid is missing, on the sheets of both lines', () => {
    const { sheets } = evaluated(
      piped({ to: 'atmosphere' }, (basis) => void delete first(basis.fluids).muVapour),
    );
    for (const key of ['inlet:rp_1', 'outlet:rp_1/own'])
      expect(sheets[key]?.refused).toMatchObject({ code: 'INPUT_MISSING', field: 'fluids/fl_v/muVapour' });
  });

  it('leaves the place of a sheet to one that was made elsewhere', () => {
    const { sheets, points } = evaluated(
      piped({ to: 'atmosphere' }, (basis) => {
        basis.externalSheets.push({
          id: 'xs_i',
          about: 'inlet',
          title: 'Inlet loss',
          author: 'Study 7',
          method: 'own',
          inputs: { point: { list: ['rp_1'] } },
          figures: { inlet_loss: q(0.05, 'bar') },
        });
      }),
    );
    expect(sheets['inlet:rp_1']?.method).toBe('external:own');
    expect(points['rp_1']?.inletLoss?.value).toBeCloseTo(0.05, 9);
  });

  it('a fitting by length counts as pipe, one by 2-K or 3-K by the constants of its name', () => {
    const loss = (name: string, by: 'K' | 'length' | '2-K' | '3-K', k: number) =>
      out(
        evaluated(
          piped({ to: 'atmosphere' }, (basis) => {
            first(basis.segments).fittings = [{ id: 'ft_1', name, count: 2, k: q(k, '-'), by }];
          }),
        ).sheets['inlet:rp_1'],
        'loss',
      );
    expect(loss('any', 'length', 10)).toBeGreaterThan(loss('any', 'K', 0));
    expect(loss('elbow 90 long radius', '3-K', 0)).toBeGreaterThan(loss('any', 'K', 0));
    expect(loss('not in the library', '2-K', 0.4)).toBeCloseTo(loss('any', 'K', 0.4), 9);
  });
});
