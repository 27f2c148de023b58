/* Curves of machines by points: the flow at which a curve meets a wanted rise, head or ratio. */

/** Where a curve is met: the flow; or that the machine never gets there, or still delivers past its last point. */
export type Met = { at: 'flow'; flow: number } | { at: 'never' } | { at: 'beyond' };

/**
 * The greatest flow at which a curve by points (flows rising) meets `wanted`, by straight lines between points. A curve that
 * droops towards shut-off is met twice; the greater flow is taken. 'never': no point reaches `wanted`; 'beyond': even the
 * last point stands above it, so that the flow lies past the points entered.
 */
export function meetCurve(flows: readonly number[], values: readonly number[], wanted: number): Met {
  const last = values.length - 1;
  if ((values[last] ?? 0) > wanted) return { at: 'beyond' };
  for (let i = last; i > 0; i -= 1) {
    const high = values[i - 1] ?? 0;
    const low = values[i] ?? 0;
    if (low === wanted) return { at: 'flow', flow: flows[i] ?? 0 };
    if (high < wanted) continue;
    const share = (high - wanted) / (high - low);
    const from = flows[i - 1] ?? 0;
    return { at: 'flow', flow: from + share * ((flows[i] ?? 0) - from) };
  }
  return { at: 'never' };
}
