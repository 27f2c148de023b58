/* The names that a relief device may bear, derived from its axes; none is ever stored. */
import type { Axes, Purpose } from './axes';
import type { Code } from './figures';

const BALANCED = { none: 'conventional', bellows: 'balanced bellows', piston: 'balanced piston' } as const;
const ACTUATED = {
  pilot: 'pilot-operated',
  power: 'power-actuated',
  temperature: 'temperature-actuated',
} as const;
const LIFTED = { full: 'full-lift', low: 'low-lift', restricted: 'restricted lift' } as const;

/** Safety valve, relief valve or safety relief valve, by the state of fluid that it is certified for. */
function nameByState(certifiedFor: Axes['certifiedFor']): string[] {
  const liquid = certifiedFor.includes('liquid');
  const compressible = certifiedFor.includes('gas') || certifiedFor.includes('steam');
  if (liquid && compressible) return ['safety relief valve'];
  if (liquid) return ['relief valve'];
  return compressible ? ['safety valve'] : [];
}

/**
 * All names that hold of a device, the most telling first; a site's terms choose which is shown.
 * @example namesOf(axes of a bellows valve for gas and liquid, 'process') → ['balanced bellows', 'safety relief valve']
 */
export function namesOf(axes: Axes, purpose: Purpose, code?: Code): string[] {
  if (axes.recloses === 'disk') return ['rupture disk'];
  if (axes.recloses === 'pin') return ['pin device'];
  if (purpose === 'emergency-vent') return ['emergency vent'];
  if (axes.direction === 'both') return ['vacuum relief valve', 'pressure-vacuum vent'];
  if (axes.direction === 'under') return ['vacuum relief valve'];
  const actuated = axes.actuation.flatMap((by) => (by === 'pressure' ? [] : [ACTUATED[by]]));
  const state = nameByState(axes.certifiedFor);
  if (actuated.length > 0) return [...actuated, ...state];
  return [BALANCED[axes.balance], ...state, ...(code?.basis === 'en' ? [LIFTED[axes.lift]] : [])];
}
