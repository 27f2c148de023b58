/* Bare arithmetic of a vessel above its critical point, heated at constant volume and vented at constant pressure. */

/** A state on the isobar of the relieving pressure: K, m³/kg, J/kg. */
export type IsobarPoint = { T: number; v: number; h: number };

/** One step along the isobar: vented mass flow in kg/s at the middle of the step, with the state there. */
export type VentStep = { W: number; T: number; v: number };

/**
 * The mass that a full vessel vents between two states of the isobar under the heat `Q` in W: the contents m = V/v take up
 * m·dh while dm = −m·dv/v leaves with its own enthalpy, so that W = Q·(dv/dh)/v. Both states by pressure, v and h rising.
 */
export function ventStep(Q: number, a: IsobarPoint, b: IsobarPoint): VentStep {
  const v = (a.v + b.v) / 2;
  return { W: (Q * (b.v - a.v)) / ((b.h - a.h) * v), T: (a.T + b.T) / 2, v };
}

/** The steps along an isobar of at least two points, rising in v and h. */
export function ventSteps(Q: number, points: readonly IsobarPoint[]): VentStep[] {
  return points.slice(1).flatMap((b, i) => {
    const a = points[i];
    return a ? [ventStep(Q, a, b)] : [];
  });
}

/** The step that asks most of the device: a nozzle of given pressure passes W in an area that goes with W·√v. */
export function governingStep(steps: readonly VentStep[]): number {
  const need = steps.map((s) => s.W * Math.sqrt(s.v));
  return need.indexOf(Math.max(...need));
}
