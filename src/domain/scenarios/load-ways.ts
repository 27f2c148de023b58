/* How the load of each standard scenario is found: the engine's methods that serve, or why an external sheet serves instead. */

/** Methods by id, the usual one first, with a word on which serves when; or the reason why the engine has none. */
export type LoadWays = { methods: readonly string[]; when: string } | { methods: readonly []; none: string };

const by = (when: string, ...methods: string[]): LoadWays => ({ methods, when });
const none = (reason: string): LoadWays => ({ methods: [], none: reason });

const GAS_THROUGH = ['f.control-valve-gas', 'f.control-valve-bypass', 'f.inadvertent-opening'] as const;
const HEAT = ['f.vaporisation', 'f.clean-exchanger'] as const;
const COOLING = ['f.loss-of-cooling', 'f.air-cooler-failure', 'f.loss-of-reflux'] as const;
const MACHINES = [
  'f.blocked-outlet',
  'f.positive-displacement',
  'f.compressor-curve',
  'f.compressor-rate',
] as const;
const REACTION = ['f.reaction-tempered', 'f.reaction-gassy', 'f.reaction-heat'] as const;

/** The ways of every standard scenario by its key. */
export const LOAD_WAYS: Readonly<Record<string, LoadWays>> = {
  'closed-outlet': by(
    'the machine on its curve or at its rating; boiling by heat; a feed by pressure through its valve',
    ...MACHINES,
    ...HEAT,
    'f.control-valve-gas',
    'f.control-valve-liquid',
    'f.inflow-balance',
  ),
  'outlet-control-valve-closed': by(
    'inflow at relieving pressure less outlets that keep their position; its parts as for a closed outlet',
    'f.inflow-balance',
    ...MACHINES,
    ...HEAT,
  ),
  'inlet-control-valve-open': by(
    'gas or liquid by the installed coefficient, with the bypass where it may stand open; flashing by a two-phase sizing of the valve outside',
    'f.control-valve-bypass',
    'f.control-valve-gas',
    'f.control-valve-liquid',
  ),
  'inadvertent-valve-opening': by(
    'full bore by the losses of the connection, or by the coefficient of the valve',
    'f.inadvertent-opening',
    'f.control-valve-gas',
    'f.control-valve-liquid',
  ),
  'gas-blow-by': by(
    'gas at the full coefficient; before it the liquid that the gas displaces, where the low side can be full',
    'f.gas-blowby',
    'f.blowby-displacement',
  ),
  'regulator-failure': by(
    'the wide-open coefficient, or the capacity that the maker states',
    'f.control-valve-gas',
    'f.control-valve-liquid',
    'f.stated-rate',
  ),
  'check-valve-reverse-flow': by(
    'several valves as one leaking orifice; a single one as an open connection',
    'f.check-valve-reverse-flow',
    'f.inadvertent-opening',
  ),
  overfill: by(
    'the filling rate at relieving pressure with the static head',
    'f.overfilling',
    'f.blocked-outlet',
    'f.positive-displacement',
  ),
  'compressor-settle-out': by(
    'the pressure of the loop at rest; between stages what the stage before still delivers',
    'f.settle-out',
    'f.compressor-curve',
    'f.compressor-rate',
  ),
  'cooling-water-loss': by(
    'heat and vapour balance at relieving pressure, whole and partial loss',
    'f.loss-of-cooling',
    ...HEAT,
  ),
  'air-cooler-loss': by('the balance with natural draught', 'f.air-cooler-failure', 'f.vaporisation'),
  'reflux-or-pumparound-loss': by(
    'the balance over the section of the column',
    'f.loss-of-reflux',
    'f.vaporisation',
  ),
  'absorbent-loss': by(
    'gas no longer absorbed less the outlet that keeps its position',
    'f.inflow-balance',
    'f.stated-rate',
  ),
  'non-condensables': by(
    'as a partial loss of cooling, for the share of the condenser that is blanketed',
    'f.loss-of-cooling',
    'f.vaporisation',
  ),
  'upstream-heat-loss': by(
    'the vapour of the flashed feed beyond the condenser; the flash comes from a property source',
    'f.inflow-balance',
    'f.loss-of-cooling',
    'f.stated-rate',
  ),
  'abnormal-heat-input': by(
    'the clean exchanger at relief, or the greatest duty',
    'f.clean-exchanger',
    'f.vaporisation',
  ),
  'volatile-ingress': none(
    'There is no accepted equation for water or light liquid that meets hot contents: it is faster than any device. It is prevented, and the measures are recorded as conditions.',
  ),
  'electric-power-loss': by(
    'a list of what stops with each bus; each load as in its own scenario, those of one system pooled',
    'f.pooled',
    ...COOLING,
    'f.vaporisation',
    'f.inflow-balance',
  ),
  'steam-loss': by(
    'as the scenarios that follow, level by level',
    'f.pooled',
    ...COOLING,
    'f.inflow-balance',
  ),
  'instrument-air-loss': by(
    'all valves in their fail position at once, by balance',
    'f.inflow-balance',
    ...GAS_THROUGH,
    'f.pooled',
  ),
  'other-utility-loss': by(
    'as the scenarios that follow',
    'f.pooled',
    ...COOLING,
    'f.inflow-balance',
    'f.stated-rate',
  ),
  'tube-rupture': by(
    'open ends, or one end and a leg of tube; liquid, gas or flashing',
    'f.tube-rupture',
    'f.vaporisation',
  ),
  'thermal-expansion': by(
    'the load, and the pressure rise that decides whether relief is needed',
    'f.thermal-expansion',
    'f.blocked-in-rise',
  ),
  'fire-wetted': by(
    'liquid that boils; above the critical point step by step',
    'e.fire-wetted',
    'e.fire-insulation',
    'e.fire-supercritical',
  ),
  'fire-unwetted': by(
    'gas only, or contents above the critical point',
    'e.fire-unwetted',
    'e.fire-supercritical',
  ),
  'jet-fire': none(
    'A jet on the wall fails it before a device lifts: it is met by fire-proofing, isolation and depressuring, not by relief. The measure and its owner are recorded.',
  ),
  'runaway-reaction': by(
    'tempered or gassy by calorimetry; a reaction held by its feed by heat balance',
    ...REACTION,
  ),
  'reaction-upset': by('as for a runaway, one answer for each error', ...REACTION),
  'internal-deflagration': none(
    'A deflagration outruns relief valves and rupture disks sized for process loads: explosion vents, suppression or containment by the standards for them (NFPA 68 and 69, EN 14491) on a sheet of their own.',
  ),
  'hydraulic-surge': none(
    'A pressure wave is over before a relief valve opens: surge is designed out by closing times, supports and dampers, by a transient study that stands as an external sheet.',
  ),
  'tank-movement-and-breathing': by(
    'filling, emptying and weather; fire by emergency venting',
    'k.out-breathing',
    'k.in-breathing',
    'k.emergency-venting',
  ),
  vacuum: by(
    'gas that must come in for liquid, vapour and heat that go; tanks by in-breathing',
    'f.vacuum-inflow',
    'k.in-breathing',
  ),
  'blanket-gas-failure': by(
    'the regulator wide open; its loss as a vacuum',
    'k.blanket-regulator',
    'f.control-valve-gas',
    'f.vacuum-inflow',
  ),
  'service-connection': by(
    'full bore at the greatest pressure of the service; condensation as a vacuum',
    'f.inadvertent-opening',
    'f.displacement',
    'f.vacuum-inflow',
  ),
  'isolated-equipment-heating': by(
    'as thermal expansion, heat input or an inlet that leaks, in the isolated state',
    'f.thermal-expansion',
    'f.blocked-in-rise',
    'f.clean-exchanger',
    'f.vaporisation',
    'f.control-valve-gas',
  ),
};
