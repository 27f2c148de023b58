/* The document rules that are built, in the order of the rulebook. */
import {
  mawpMissing,
  mawpNotGoverning,
  mawpRaisedWithoutRerate,
  mawpTemperatureExceeded,
} from './a-equipment/mawp';
import { boundaryValveUnregistered, equipmentUnprotected, vacuumUnprotected } from './a-equipment/protection';
import { setAboveMawp, setAdditionalAbove105, setFireSupplement, setsNotStaggered } from './b-set/limits';
import { blowdownOutsideRange, operatingMarginSmall, reseatBelowOperating } from './b-set/operation';
import { setOutsideSpringRange, tankVentSetHigh, thermalReliefSetHigh } from './b-set/special';
import {
  accumulationAboveLimit,
  accumulationLimitMisused,
  enLimitExceeded,
  storageLimitMisused,
  testPressureLimitUsed,
} from './c-accumulation';
import { balancedTotalHigh, conventionalBuiltUpHigh, superimposedVariable } from './d-device/back-pressure';
import { certificationMissing, pilotUnfit, reducedLiftMisused } from './d-device/build';
import {
  actuatedDeviceAlone,
  nonReclosingAlone,
  openBonnetUnfit,
  trimDoesNotSuitState,
} from './d-device/suitability';
import {
  diskBurstAboveLimit,
  diskCombinationFactor,
  diskObstructsValve,
  diskOperatingRatio,
  diskSpaceUnmonitored,
  diskValvePressureGap,
} from './e-disks';
import {
  areaKindMixed,
  capacityMarginal,
  capacityShort,
  groupMissing,
  lowLoadChatter,
  spareCredited,
} from './f-capacity';
import { inletLossHigh, inletLossNearBlowdown, lineLossMissing } from './g-lines';
import {
  bonnetVentWrong,
  cdtpMismatch,
  cdtpMissing,
  isolationRestricts,
  isolationUnlocked,
} from './i-valves-and-settings';
import {
  densityInconsistent,
  kOutsideRange,
  latentHeatLow,
  stateNotAtRelief,
  zOutsideRange,
} from './k-fluids';
import { correctionFactorMissing, phaseMismatch, reactionDataMissing } from './k-methods';
import { fireDrainageUnsupported, fireInsulationCredit, fireZoneMissing } from './l-fire';
import {
  commonCauseUnlinked,
  doubleJeopardyUnsupported,
  scenarioReasonThin,
  scenarioStatusMissing,
  scenarioUndecided,
} from './m-scenarios/dispositions';
import {
  activeSafeguardCredited,
  checkValveCredited,
  reasonWithoutFieldCheck,
  tubeRuptureScreen,
} from './m-scenarios/safeguards';
import {
  belowLimitBoundStale,
  calculationUnsound,
  copiedFigureStale,
  externalSheetStale,
  methodFromMemory,
} from './p-figures/sheets';
import { originMissing, unitSlipSuspected, valueImplausible, valueImpossible } from './p-figures/values';
import { type Rule } from './types';

/** Every document rule. */
export const RULEBOOK: readonly Rule[] = [
  mawpMissing,
  mawpNotGoverning,
  mawpTemperatureExceeded,
  mawpRaisedWithoutRerate,
  vacuumUnprotected,
  equipmentUnprotected,
  boundaryValveUnregistered,
  setAboveMawp,
  setAdditionalAbove105,
  setFireSupplement,
  setsNotStaggered,
  operatingMarginSmall,
  reseatBelowOperating,
  setOutsideSpringRange,
  blowdownOutsideRange,
  thermalReliefSetHigh,
  tankVentSetHigh,
  accumulationAboveLimit,
  accumulationLimitMisused,
  enLimitExceeded,
  storageLimitMisused,
  testPressureLimitUsed,
  conventionalBuiltUpHigh,
  superimposedVariable,
  balancedTotalHigh,
  pilotUnfit,
  trimDoesNotSuitState,
  openBonnetUnfit,
  reducedLiftMisused,
  actuatedDeviceAlone,
  nonReclosingAlone,
  certificationMissing,
  diskBurstAboveLimit,
  diskOperatingRatio,
  diskCombinationFactor,
  diskSpaceUnmonitored,
  diskObstructsValve,
  diskValvePressureGap,
  capacityShort,
  capacityMarginal,
  lowLoadChatter,
  groupMissing,
  spareCredited,
  areaKindMixed,
  lineLossMissing,
  inletLossHigh,
  inletLossNearBlowdown,
  isolationRestricts,
  isolationUnlocked,
  cdtpMissing,
  cdtpMismatch,
  bonnetVentWrong,
  stateNotAtRelief,
  phaseMismatch,
  kOutsideRange,
  zOutsideRange,
  densityInconsistent,
  correctionFactorMissing,
  latentHeatLow,
  reactionDataMissing,
  fireDrainageUnsupported,
  fireInsulationCredit,
  fireZoneMissing,
  scenarioUndecided,
  scenarioStatusMissing,
  scenarioReasonThin,
  doubleJeopardyUnsupported,
  activeSafeguardCredited,
  checkValveCredited,
  reasonWithoutFieldCheck,
  tubeRuptureScreen,
  commonCauseUnlinked,
  valueImpossible,
  valueImplausible,
  unitSlipSuspected,
  originMissing,
  calculationUnsound,
  methodFromMemory,
  copiedFigureStale,
  belowLimitBoundStale,
  externalSheetStale,
];

const BY_CODE = new Map(RULEBOOK.map((rule) => [rule.code, rule]));

/** The rule with this code, or nothing. */
export function ruleOf(code: string): Rule | undefined {
  return BY_CODE.get(code);
}
