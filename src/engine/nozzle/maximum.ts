/* The first maximum of a smooth function along a path, with few evaluations: what a nozzle's throat is. */

/** A point of the path and the function's value there. */
export type Point = { y: number; f: number };

/** What was found: the greatest value before the function falls, and whether it falls at all before the end. */
export type Peak = Point & { inside: boolean };

const MAX_REFINEMENTS = 40;

/** Vertex of the parabola through three points, or undefined where they do not bend downwards. */
function vertex(a: Point, b: Point, c: Point): number | undefined {
  const left = (b.y - a.y) * (b.f - c.f);
  const right = (b.y - c.y) * (b.f - a.f);
  const bend = 2 * (left - right);
  if (bend === 0 || !Number.isFinite(bend)) return undefined;
  return b.y - ((b.y - a.y) * left - (b.y - c.y) * right) / bend;
}

/** A point of the wider side of the bracket, for when the parabola is of no use. */
function golden(a: Point, b: Point, c: Point): number {
  return c.y - b.y > b.y - a.y ? b.y + 0.381966 * (c.y - b.y) : b.y - 0.381966 * (b.y - a.y);
}

/**
 * Width of the bracket below which a parabola through it is believed, absolute and as a share of the way from the start, near
 * which a flux grows like a root; and the gain, over f, that is worth a look.
 */
const BELIEVED = 0.1;
const BELIEVED_SHARE = 0.15;
const WORTH = 1e-8;

/** What the parabola promises above the middle point, at its vertex. */
function promised([a, b, c]: Bracket, y: number): number {
  const left = (b.f - a.f) / (b.y - a.y);
  const bend = ((c.f - b.f) / (c.y - b.y) - left) / (c.y - a.y);
  return (left + bend * (y - a.y)) * (y - b.y);
}

type Bracket = readonly [Point, Point, Point];

/** The next place to look, inside the bracket and apart from the points that are known; undefined when b is good enough. */
function nextPlace(bracket: Bracket, tolerance: number, force: boolean): number | undefined {
  const [a, b, c] = bracket;
  const guess = force ? undefined : vertex(a, b, c);
  if (guess === undefined || !(guess > a.y && guess < c.y)) return golden(a, b, c);
  const narrow = c.y - a.y < Math.min(BELIEVED, BELIEVED_SHARE * b.y);
  if (narrow && promised(bracket, guess) < WORTH * b.f) return undefined;
  const apart = Math.abs(guess - b.y) >= tolerance / 2;
  return apart ? guess : b.y + (c.y - b.y > b.y - a.y ? tolerance / 2 : -tolerance / 2);
}

/** The maximum between a and c, b being higher than both; undefined where the function has no value. */
function refine(f: (y: number) => number | undefined, start: Bracket, tolerance: number): Point | undefined {
  let [a, b, c] = start;
  let width = c.y - a.y;
  for (let i = 0; i < MAX_REFINEMENTS && c.y - a.y > tolerance; i += 1) {
    const force = i % 4 === 3 && c.y - a.y > width / 2;
    if (i % 4 === 3) width = c.y - a.y;
    const y = nextPlace([a, b, c], tolerance, force);
    if (y === undefined) return b;
    const value = f(y);
    if (value === undefined) return undefined;
    const at = { y, f: value };
    if (at.f >= b.f) [a, b, c] = y > b.y ? [b, at, c] : [a, at, b];
    else [a, c] = y > b.y ? [a, at] : [at, c];
  }
  return b;
}

/** The maximum between the start and a lower point: the start itself when the function falls away from it. */
function fromStart(
  f: (y: number) => number | undefined,
  start: Point,
  lower: Point,
  tolerance: number,
): Point | undefined {
  const y = Math.max(lower.y / 256, tolerance);
  const value = f(y);
  if (value === undefined) return undefined;
  return value <= start.f ? start : refine(f, [start, { y, f: value }, lower], tolerance);
}

/** The end of the way, unless the function falls just ahead of it: then the maximum lies between the last two points. */
function atEnd(
  f: (y: number) => number | undefined,
  before: Point,
  end: Point,
  tolerance: number,
): Peak | undefined {
  const y = end.y - tolerance;
  if (y <= before.y) return { ...end, inside: false };
  const value = f(y);
  if (value === undefined) return undefined;
  if (value <= end.f) return { ...end, inside: false };
  const found = refine(f, [before, { y, f: value }, end], tolerance);
  return found && { ...found, inside: true };
}

/**
 * The first maximum of `f` on [0, end], met with growing steps from 0 (where f is `first`); when f does not fall, its value
 * at the end. Undefined where f has no value. `tolerance` is on y.
 */
export function firstMaximum(
  f: (y: number) => number | undefined,
  end: number,
  options: { first: number; step: number; tolerance: number },
): Peak | undefined {
  let before: Point = { y: 0, f: options.first };
  let here = before;
  // On a way shorter than the tolerance only rounding could rise and fall: it is taken in one step.
  let step = end <= options.tolerance ? end : Math.min(options.step, end / 2);
  while (here.y < end) {
    const y = here.y + 1.5 * step >= end ? end : here.y + step;
    const value = f(y);
    if (value === undefined) return undefined;
    const next = { y, f: value };
    if (next.f < here.f) {
      const found =
        here.y === 0
          ? fromStart(f, here, next, options.tolerance)
          : refine(f, [before, here, next], options.tolerance);
      return found && { ...found, inside: true };
    }
    [before, here] = [here, next];
    step *= 2;
  }
  return atEnd(f, before, here, options.tolerance);
}
