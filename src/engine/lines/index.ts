/* The public face of the line arithmetic: bare SI numbers, no sheets. */
export { adiabaticLine, type AdiabaticSegment } from './adiabatic';
export { isothermalLine, type IsothermalSegment } from './isothermal';
export { liquidDrop, liquidLine } from './liquid';
export { marchedLine, type MarchedSegment, type RisingSegment } from './march';
export { exitState, inletLine, pipeDischarge, type Exit, type FedLine } from './entrance';
export { fannoFunction, fannoPressureRatio } from './fanno';
export { colebrook, frictionFactor, reynolds } from './friction';
export { boreArea, type Enlargement, fluxOf, type LineGas, type LineSegment, velocityHeads } from './segment';
export { liquidCurve, omegaCurve, volumeAt, volumeCurve, type VolumeCurve, type VolumePoint } from './volume';
export { FITTING_METHODS, fittingK, type FittingMethod, fittingNamed } from './fittings';
export { type Fitting, FITTING_SOURCES, FITTINGS } from './fitting-data';
export {
  adiabaticProfile,
  type DrawnSegment,
  isothermalProfile,
  type LinePoint,
  marchedProfile,
} from './profile';
