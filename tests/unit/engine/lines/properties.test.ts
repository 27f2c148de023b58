/* Laws that any line must keep: more flow or more pipe needs more pressure, nothing is supersonic, the models agree where they must. */
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { calculate } from '../../../../src/engine/calc';
import {
  adiabaticLine,
  adiabaticProfile,
  boreArea,
  frictionFactor,
  inletLine,
  isothermalLine,
  isothermalProfile,
  type LineGas,
  type LineSegment,
  liquidCurve,
  liquidLine,
  marchedLine,
  marchedProfile,
  omegaCurve,
  pipeDischarge,
  volumeCurve,
} from '../../../../src/engine/lines';

const gas = fc.record({
  T: fc.double({ min: 100, max: 900, noNaN: true }),
  Z: fc.double({ min: 0.4, max: 1.3, noNaN: true }),
  M: fc.double({ min: 2, max: 200, noNaN: true }),
  k: fc.double({ min: 1, max: 1.67, noNaN: true }),
});
const pipe = fc.record({
  D: fc.double({ min: 0.01, max: 1, noNaN: true }),
  N: fc.double({ min: 0, max: 200, noNaN: true }),
});
const pipes = fc.array(pipe, { minLength: 1, maxLength: 5 });
const flow = fc.double({ min: 1e-3, max: 200, noNaN: true });
const end = fc.double({ min: 1e4, max: 2e6, noNaN: true });
const omega = fc.double({ min: 0, max: 40, noNaN: true });

const carrying = (list: { D: number; N: number }[], W: number): LineSegment[] =>
  list.map((one) => ({ ...one, W }));
/** Pipes that only widen, as an outlet does. */
const widening = (list: { D: number; N: number }[]) => list.toSorted((a, b) => a.D - b.D);

const models: Record<
  string,
  (list: LineSegment[], of: LineGas, pe: number) => { inlet: number; outlet: number }[]
> = {
  isothermal: (list, of, pe) => isothermalLine(list, of, pe),
  adiabatic: (list, of, pe) => adiabaticLine(list, of, pe),
  'adiabatic with momentum balance': (list, of, pe) => adiabaticLine(list, of, pe, 'momentum'),
};
const inletOf = (worked: { inlet: number }[]): number => worked[0]?.inlet ?? Number.NaN;

describe.each(Object.entries(models))('a gas line, %s', (name, work) => {
  // The momentum balance gives pressure back at an enlargement, the more the faster the flow: there only more pipe needs more.
  it('needs more pressure for more flow and for more pipe', () => {
    fc.assert(
      fc.property(pipes, gas, flow, end, (list, of, W, pe) => {
        const at = (share: number, extra: number) =>
          inletOf(
            work(
              carrying(
                list.map((one) => ({ ...one, N: one.N + extra })),
                W * share,
              ),
              of,
              pe,
            ),
          );
        if (name !== 'adiabatic with momentum balance')
          expect(at(1.05, 0)).toBeGreaterThanOrEqual(at(1, 0) * (1 - 1e-9));
        expect(at(1, 1)).toBeGreaterThanOrEqual(at(1, 0) * (1 - 1e-9));
      }),
      { numRuns: 2000 },
    );
  });

  it('is never supersonic, never below the pressure beyond it where it widens, and always finite', () => {
    fc.assert(
      fc.property(pipes, gas, flow, end, (list, of, W, pe) => {
        const worked = work(carrying(widening(list), W), of, pe);
        for (const one of worked) {
          expect(Number.isFinite(one.inlet)).toBe(true);
          expect(one.inlet).toBeGreaterThanOrEqual(one.outlet * (1 - 1e-9));
          if ('machOut' in one) expect(one.machOut).toBeLessThanOrEqual(1 + 1e-9);
        }
        if (name !== 'adiabatic with momentum balance')
          expect(inletOf(worked)).toBeGreaterThanOrEqual(pe * (1 - 1e-9));
      }),
      { numRuns: 2000 },
    );
  });
});

describe('models against each other', () => {
  it('isothermal and adiabatic agree where the Mach number is low', () => {
    fc.assert(
      fc.property(pipe, gas, end, fc.double({ min: 0.001, max: 0.03, noNaN: true }), (one, of, pe, mach) => {
        const c = Math.sqrt((of.k * of.Z * 8314.462618 * of.T) / of.M);
        const W = ((mach * c * pe * of.M) / (of.Z * 8314.462618 * of.T)) * boreArea(one.D);
        const list = carrying([one], W);
        const [a, b] = [inletOf(isothermalLine(list, of, pe)), inletOf(adiabaticLine(list, of, pe))];
        expect(Math.abs(a / b - 1)).toBeLessThan(0.002);
      }),
      { numRuns: 1000 },
    );
  });

  it('homogeneous flow on v ∝ 1/P is isothermal gas flow, on constant v it is liquid flow', () => {
    fc.assert(
      fc.property(fc.array(pipe, { minLength: 1, maxLength: 3 }), gas, flow, end, (some, of, W, pe) => {
        const list = carrying(widening(some), W);
        const curve = [{ low: 0, high: Infinity, a: 0, b: (of.Z * 8314.462618 * of.T) / of.M }];
        const marched = inletOf(marchedLine(list, curve, pe) ?? []);
        expect(marched / inletOf(isothermalLine(list, of, pe))).toBeCloseTo(1, 6);
        const rho = of.M * 5;
        const full = inletOf(marchedLine(list, liquidCurve(rho), pe) ?? []);
        expect(full / (liquidLine(list, rho, pe)[0] ?? 0)).toBeCloseTo(1, 6);
      }),
      { numRuns: 500 },
    );
  });

  it('a two-phase line needs more pressure for more flow and is below its own limit everywhere', () => {
    fc.assert(
      fc.property(pipes, omega, flow, end, (some, w, W, pe) => {
        const curve = omegaCurve(2e6, 0.01, w);
        const list = widening(some);
        const worked = marchedLine(carrying(list, W), curve, pe);
        const more = marchedLine(carrying(list, W * 1.05), curve, pe);
        expect(inletOf(more ?? [])).toBeGreaterThanOrEqual(inletOf(worked ?? []) * (1 - 1e-6));
        for (const one of worked ?? []) expect(one.machOut).toBeLessThanOrEqual(1 + 1e-6);
      }),
      { numRuns: 1000 },
    );
  });

  it('a pipe lets out what the line from the same vessel may carry, and no more', () => {
    fc.assert(
      fc.property(
        gas,
        fc.double({ min: 0.01, max: 100, noNaN: true }),
        end,
        fc.double({ min: 1.05, max: 50, noNaN: true }),
        (of, N, pe, ratio) => {
          const P0 = pe * ratio;
          const out = pipeDischarge(P0, of, N, pe);
          expect(out).toBeDefined();
          if (!out) return;
          expect(out.machOut).toBeLessThanOrEqual(1 + 1e-9);
          expect(out.exit).toBeGreaterThanOrEqual(pe * (1 - 1e-6));
          const less = inletLine(P0, of, out.flux * 0.98, N);
          expect(less?.exit ?? Number.NaN).toBeGreaterThan(out.exit * (1 - 1e-9));
          expect(inletLine(P0, of, out.choked ? out.flux * 1.02 : Number.MAX_VALUE, N)).toBeUndefined();
        },
      ),
      { numRuns: 1000 },
    );
  });
});

describe('profiles', () => {
  it('start and end where the line does, fall all the way down a bore, and speed up', () => {
    fc.assert(
      fc.property(pipes, gas, flow, end, (some, of, W, pe) => {
        const drawn = widening(some).map((one) => ({ ...one, W, L: 10 }));
        const curve = volumeCurve([
          { P: 1e4, v: 10 },
          { P: 1e6, v: 0.1 },
        ]);
        const pairs = [
          [isothermalProfile(drawn, of, pe, 8), isothermalLine(drawn, of, pe)],
          [adiabaticProfile(drawn, of, pe, 'static', 8), adiabaticLine(drawn, of, pe)],
          [curve ? marchedProfile(drawn, curve, pe, 8) : [], (curve && marchedLine(drawn, curve, pe)) ?? []],
        ] as const;
        for (const [profile, worked] of pairs) {
          expect(profile).toHaveLength(drawn.length * 9);
          expect((profile[0]?.P ?? 0) / (worked[0]?.inlet ?? 1)).toBeCloseTo(1, 6);
          expect((profile.at(-1)?.P ?? 0) / (worked.at(-1)?.outlet ?? 1)).toBeCloseTo(1, 6);
          for (let i = 1; i < profile.length; i += 1) {
            const [a, b] = [profile[i - 1], profile[i]];
            if (!a || !b || a.segment !== b.segment) continue;
            expect(b.P).toBeLessThanOrEqual(a.P * (1 + 1e-7));
            expect(b.velocity).toBeGreaterThanOrEqual(a.velocity * (1 - 1e-7));
            expect(b.x).toBeGreaterThan(a.x);
          }
        }
      }),
      { numRuns: 200 },
    );
  });
});

describe('friction', () => {
  it('makes a loss that never falls when the flow rises, across the change to turbulence too', () => {
    const rough = fc.double({ min: 0, max: 0.05, noNaN: true });
    fc.assert(
      fc.property(fc.double({ min: 1, max: 1e8, noNaN: true }), rough, (Re, relative) => {
        const loss = (number: number) => frictionFactor(number, relative) * number ** 2;
        expect(loss(Re * 1.001)).toBeGreaterThan(loss(Re));
      }),
      { numRuns: 20000 },
    );
  });
});

describe('units', () => {
  it('SI and US inputs give the same line to 1e-9', () => {
    fc.assert(
      fc.property(pipe, gas, flow, end, (one, of, W, pe) => {
        fc.pre(of.k > 1);
        const same = {
          Z: { value: of.Z },
          M: { value: of.M, unit: 'kg/kmol' },
          k: { value: of.k },
          sum_K: { value: one.N },
        };
        const SI = {
          ...same,
          W: { value: W, unit: 'kg/s' },
          T0: { value: of.T, unit: 'K' },
          D: { value: one.D, unit: 'm' },
          P_exit_ambient: { value: pe / 1e3, unit: 'kPa_abs' },
        };
        const US = {
          ...same,
          W: { value: (W / 0.45359237) * 3600, unit: 'lb/h' },
          T0: { value: of.T * 1.8, unit: 'degR' },
          D: { value: one.D / 0.0254, unit: 'in' },
          P_exit_ambient: { value: pe / 6894.757293168361, unit: 'psia' },
        };
        const pressure = (inputs: typeof SI) =>
          Number(calculate({ topic: 'g.outlet-fanno', inputs }).outputs['segment1_inlet_pressure']?.value);
        expect(Math.abs((pressure(US) * 6.894757293168361) / pressure(SI) - 1)).toBeLessThan(1e-9);
      }),
      { numRuns: 300 },
    );
  });
});
