/* Ranges for the figures of a document that the rulebook gives none; each says from what it was set. */
import { row, type RangeRow } from './row';

/** Ranges of our own, by key. */
export const OWN_RANGES: readonly RangeRow[] = [
  // Pressures. Common practice, no source: pilots and balanced devices reach 70 % of set; 50 % is the site limit.
  row('backPressureLimit', 'limit of the total back pressure', 'kPa_g', [0, 20, 20700, 690000], {
    also: [{ unit: '-', range: [0, 0.1, 0.7, 1] }],
  }),
  // As the set pressure that it is derived from.
  row('cdtp', 'cold differential test pressure', 'kPa_g', [0, 100, 41400, 690000], { open: true }),
  // As the vacuum valve set: nothing lies further below atmosphere than a full vacuum.
  row('designVacuum', 'design vacuum', 'kPa', [0, 0.05, 101.3, 101.325], {
    also: [{ unit: 'kPa_g', range: [0, 0.05, 101.3, 101.325] }],
  }),
  // Pressure ratings of flanges and bodies: as MAWP, low ones included (bellows, bonnets).
  row('rating', 'pressure rating', 'kPa_g', [0, 20, 70000, 700000], { open: true }),
  // Anything upstream: as MAWP, absolute; below atmosphere for vacuum columns.
  row('sourcePressure', 'pressure of the source', 'kPa_abs', [0, 5, 35000, 700000], { open: true }),
  row('suction', 'suction pressure', 'kPa_g', [-101.3, -95, 20000, 700000]),
  // 1.5 times the ranges of MAWP (hydrostatic tests of 1.3 to 1.5 times).
  row('testPressure', 'test pressure', 'kPa_g', [0, 100, 52500, 1050000], { open: true }),
  row('h2sPartialPressure', 'partial pressure of hydrogen sulphide', 'kPa_abs', [0, 0, 5000, 100000]),

  // Temperatures: as the design temperature.
  row('operatingTemperature', 'operating temperature', 'degC', [-270, -200, 600, 1200]),
  row('freezingPoint', 'freezing point', 'degC', [-273.15, -220, 300, 1200]),
  // From memory: sun and tracing warm by tens of kelvin; boiling ranges of wide cuts reach a few hundred.
  row('temperatureRise', 'temperature rise', 'dK', [0, 0, 300, 1200]),

  // Loads and machine flows: as the relief load.
  row('capacity', 'certified capacity', 'kg/h', [0, 1, 2000000, 20000000], {
    open: true,
    also: [
      { unit: 'Nm3/h', range: [0, 1, 2000000, 20000000] },
      { unit: 'm3/h', range: [0, 0.01, 20000, 200000] },
    ],
  }),
  row('machineFlow', 'rated flow of the machine', 'm3/h', [0, 0.1, 20000, 1000000], {
    open: true,
    also: [
      { unit: 'kg/h', range: [0, 1, 2000000, 20000000] },
      { unit: 'Nm3/h', range: [0, 1, 1000000, 20000000] },
    ],
  }),

  // Pumps: heads as the pump differential at shut-off; sizes and speeds from memory of makers' lists.
  row('pumpFlow', 'pump flow', 'm3/h', [0, 0, 20000, 200000], {
    also: [{ unit: 'kg/h', range: [0, 0, 20000000, 200000000] }],
  }),
  row('pumpHead', 'pump differential', 'kPa', [0, 10, 30000, 200000], {
    also: [{ unit: 'm', range: [0, 1, 3000, 20000] }],
  }),
  row('pumpCoefficient', 'coefficient of the pump curve', 'kPa/(m3/h)^2', [0, 1e-7, 100, 1000000]),
  row('impeller', 'impeller diameter', 'mm', [10, 60, 1500, 5000]),
  row('speed', 'speed', 'rpm', [0.1, 20, 20000, 250000]),

  // Geometry: from the vessel and line ranges of the rulebook.
  row('clearance', 'distance', 'm', [-200, -50, 100, 1000]),
  row('rise', 'rise', 'm', [-200, -60, 60, 200]),
  row('tubeLength', 'tube length', 'm', [0.05, 0.5, 15, 60]),
  row('wall', 'wall thickness', 'mm', [0.3, 2, 150, 500]),
  row('volume', 'volume', 'm3', [0, 0.005, 50000, 300000], { open: true }),
  row('inventory', 'inventory', 'kg', [0, 1, 50000000, 300000000], {
    also: [{ unit: 'm3', range: [0, 0.005, 50000, 300000] }],
  }),
  // The rulebook's zone of 230 to 460 m², with the bounds of its parameter as plausible.
  row('fireZoneArea', 'area of the fire zone', 'm2', [1, 150, 600, 20000]),

  // Properties of fluids: from the densities of the rulebook (14 000 kg/m³ and 0.005 kg/m³).
  row('relativeDensity', 'relative density', '-', [0.06, 0.38, 1.9, 14]),
  row('specificVolume', 'specific volume', 'm3/kg', [0.00007, 0.0005, 10, 200]),
  row('fraction', 'fraction', '-', [0, 0, 1, 1]),

  // Properties of metals: from memory (steel 200 GPa, 0.3, 11 to 17e-6 1/K; aluminium 23e-6).
  row('modulus', 'modulus of elasticity', 'MPa', [1000, 60000, 220000, 500000]),
  row('metalExpansion', 'linear expansion of the metal', '1/K', [0.0000005, 0.000008, 0.000026, 0.0001]),
  row('poisson', 'Poisson ratio', '-', [0, 0.2, 0.4, 0.5]),
  row('stress', 'stress', 'MPa', [1, 10, 700, 3000]),
  row('stressRatio', 'stress ratio of the test', '-', [0.5, 1, 2, 6]),

  // Heat: a UA of 0.1 to 5 000 kW/K spans coils and the largest reboilers (from memory).
  row('ua', 'UA', 'kW/K', [0, 0.05, 5000, 100000], { open: true }),

  // Force and motion: the rulebook's bounds of the load factor; frequencies of spring and disk from memory.
  row('dlf', 'dynamic load factor', '-', [1, 1.1, 2, 4]),
  row('frequency', 'natural frequency', 'Hz', [0.5, 5, 500, 5000]),
  // A person credited in less than a minute is not credited; more than a day is no response.
  row('minutes', 'time to act', 'min', [0, 1, 240, 1440]),
];
