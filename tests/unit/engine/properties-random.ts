/* Random inputs for any method of the catalogue: ordinary, odd and absurd, made from what the method says of its inputs. */
import fc from 'fast-check';
import { CHECK_CASES } from '@/checks';
import { engineInputs } from '@engine/calc';
import { type Method, type MethodInput } from '@engine/catalog';
import { fromSI, type Q, toSI, UNITS } from '@engine/quantity';
import { RANGES } from '@engine/ranges';
import { type Inputs } from '@engine/sheet';

const ABSURD = [
  0,
  -0,
  -1,
  1e-300,
  5e-324,
  1e300,
  1.7e308,
  -1e300,
  1e-9,
  1e9,
  Number.NaN,
  Infinity,
  -Infinity,
];

/** Units of a dimension, in the order of the table. */
export function unitsOf(dimension: string): string[] {
  return Object.keys(UNITS).filter((unit) => UNITS[unit]?.dimension === dimension);
}

/** A value between the plausible bounds of the input's range, else over nine decades; now and then beyond all bounds. */
function figure(input: MethodInput, dimension: string): fc.Arbitrary<Q> {
  const row = input.rangeKey === undefined ? undefined : RANGES[input.rangeKey];
  const fence =
    row &&
    [{ unit: row.unit, range: row.range }, ...(row.also ?? [])].find(
      ({ unit }) => UNITS[unit]?.dimension === dimension,
    );
  const [least, low, high, most] = fence?.range ?? [1e-3, 1e-2, 1e5, 1e6];
  const base = fence?.unit ?? unitsOf(dimension)[0] ?? '-';
  const share = fc.double({ min: 0, max: 1, noNaN: true });
  const between = (a: number, b: number) =>
    share.map((x) => (a > 0 && b / a > 100 ? a * (b / a) ** x : a + (b - a) * x));
  const value = fc.oneof(
    { weight: 16, arbitrary: between(low, high) },
    { weight: 2, arbitrary: between(least, most) },
    { weight: 1, arbitrary: fc.constantFrom(...ABSURD) },
  );
  const units = unitsOf(dimension);
  const unit = fc.oneof(
    { weight: 40, arbitrary: fc.constantFrom(...(units.length > 0 ? units : ['-'])) },
    { weight: 1, arbitrary: fc.constantFrom('-', 'K', 'bar', 'no-such-unit', '__proto__') },
  );
  return fc.tuple(value, unit).map(([v, u]): Q => {
    const known = UNITS[u]?.dimension === dimension && UNITS[base]?.dimension === dimension;
    return known ? fromSI(toSI({ value: v, unit: base }), u) : { value: v, unit: u };
  });
}

function valueOf(input: MethodInput): fc.Arbitrary<Q | string | boolean> {
  const odd: fc.Arbitrary<Q | string | boolean> = fc.oneof(
    fc.boolean(),
    fc.string({ maxLength: 8 }),
    fc.constant({ value: 1, unit: '-' }),
  );
  const usual: fc.Arbitrary<Q | string | boolean> =
    input.words && input.words.length > 0
      ? fc.constantFrom(...input.words)
      : input.dimension
        ? figure(input, input.dimension)
        : fc.oneof(fc.boolean(), fc.constantFrom('water', 'propane', 'methane 0.7; ethane 0.3'));
  return fc.oneof({ weight: 40, arbitrary: usual }, { weight: 1, arbitrary: odd });
}

/** Inputs from nothing: what the method needs (nearly always), what it may take (half the time), numbered ones up to three. */
function fromNothing(method: Method): fc.Arbitrary<Inputs> {
  const fields = method.inputs.flatMap((input) => {
    const names =
      input.each === undefined ? [input.name] : [input.name, `${input.name}_2`, `${input.name}_3`];
    return names.map((name, i) => {
      const nil = i === 0 && input.required ? 40 : 2;
      return [name, fc.option(valueOf(input), { freq: nil, nil: undefined })] as const;
    });
  });
  return fc
    .record(Object.fromEntries(fields))
    .map(
      (all) => Object.fromEntries(Object.entries(all).filter(([, value]) => value !== undefined)) as Inputs,
    );
}

/** The inputs of the check values of a method. */
export function checkInputs(method: Method): Inputs[] {
  return CHECK_CASES.filter((one) => one.topic === method.topic).map((one) =>
    engineInputs(method, one.inputs),
  );
}

/** Inputs of a check value with one to three of them changed: these get further into the arithmetic. */
function fromCheck(method: Method, known: readonly Inputs[]): fc.Arbitrary<Inputs> {
  const change = fc
    .constantFrom(...method.inputs)
    .chain((input) =>
      fc.tuple(fc.constant(input.name), fc.option(valueOf(input), { freq: 12, nil: undefined })),
    );
  return fc
    .tuple(fc.constantFrom(...known), fc.array(change, { minLength: 1, maxLength: 3 }))
    .map(([base, changes]) => {
      const all = Object.entries({ ...base, ...Object.fromEntries(changes) });
      return Object.fromEntries(all.filter(([, value]) => value !== undefined)) as Inputs;
    });
}

/** Inputs for a method: half of them made from nothing, half from check values where it has some. */
export function inputsFor(method: Method): fc.Arbitrary<Inputs> {
  const known = checkInputs(method);
  return known.length === 0 ? fromNothing(method) : fc.oneof(fromNothing(method), fromCheck(method, known));
}
