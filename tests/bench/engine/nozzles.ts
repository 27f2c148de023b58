/* Nozzles by direct integration, worked whole: from the fluid's name or composition to the throat. */
import { readComposition, fluidOf } from '@engine/fluids';
import { hemThroat } from '@engine/nozzle/hem';
import { inletAtQuality } from '@engine/nozzle/inlet';
import { type PropertySource } from '@engine/properties/types';
import { WATER } from '@engine/water';
import { drain } from './measure';

/** A light-ends liquid of ten components; an invented composition, chosen to be ordinary. */
const TEN =
  'methane 0.02; ethane 0.05; propane 0.2; isobutane 0.13; n-butane 0.2; isopentane 0.1; n-pentane 0.1; n-hexane 0.1; n-heptane 0.06; n-octane 0.04';

function throatOf(source: PropertySource, P0: number, x0: number): number | undefined {
  const inlet = inletAtQuality(source, P0, x0);
  return inlet && hemThroat(source, inlet.state, 101_325)?.flux;
}

/** Saturated water at 1 MPa, through a nozzle to the air. */
export function waterNozzle(i: number): void {
  drain(throatOf(WATER, 1e6 * (1 + (i % 1000) * 1e-5), 0) ?? 0);
}

/** The ten components at their bubble point at 1.5 MPa; undefined where this engine has no mixtures. */
export function mixtureNozzle(): ((i: number) => void) | undefined {
  const read = readComposition(TEN);
  const source = read.ok ? fluidOf(read.composition) : undefined;
  if (!source || throatOf(source, 1.5e6, 0) === undefined) return undefined;
  return (i) => drain(throatOf(source, 1.5e6 * (1 + (i % 1000) * 1e-5), 0) ?? 0);
}
