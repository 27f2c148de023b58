/* The 31 causes of the invented site and the keys of our standard list. */

const KEYS: Record<string, string> = {
  'closed-outlet': 'closed-outlet',
  'inadvertent-valve-opening': 'inadvertent-valve-opening',
  'check-valve-failure': 'check-valve-reverse-flow',
  'inlet-control-failure': 'inlet-control-valve-open',
  'gas-blowby': 'gas-blow-by',
  'outlet-control-failure': 'outlet-control-valve-closed',
  'regulator-failure': 'regulator-failure',
  'cooling-water-failure': 'cooling-water-loss',
  'air-cooler-failure': 'air-cooler-loss',
  'reflux-failure': 'reflux-or-pumparound-loss',
  'absorbent-failure': 'absorbent-loss',
  'non-condensables': 'non-condensables',
  'volatile-entry': 'volatile-ingress',
  overfilling: 'overfill',
  'abnormal-heat': 'abnormal-heat-input',
  'thermal-expansion': 'thermal-expansion',
  'fire-wetted': 'fire-wetted',
  'fire-unwetted': 'fire-unwetted',
  'jet-fire': 'jet-fire',
  'tube-rupture': 'tube-rupture',
  'power-failure': 'electric-power-loss',
  'other-utility-failure': 'other-utility-loss',
  'chemical-reaction': 'runaway-reaction',
  'explosion-surge': 'internal-deflagration',
  'loss-of-quench': 'reaction-upset',
  'series-fractionation': 'upstream-heat-loss',
  vacuum: 'vacuum',
  'blanket-regulator-failure': 'blanket-gas-failure',
  'standby-states': 'isolated-equipment-heating',
};

/** Our key for one of their causes. `explosion-surge` also answers `hydraulic-surge`. */
export function scenarioKey(cause: string): string {
  return KEYS[cause] ?? cause;
}

/** The causes that are asked once a system and not as scenarios. */
export const ONCE_CAUSES: Record<string, 'level-swell' | 'simultaneous-loads'> = {
  'two-phase-swell': 'level-swell',
  'common-cause': 'simultaneous-loads',
};
