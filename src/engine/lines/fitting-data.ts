/* Fittings of relief lines with their published resistance figures. */

/** A fitting; every figure is dimensionless save `threeK.Kd`, in in^0.3. `K` stands where the resistance is a fixed number of velocity heads. */
export type Fitting = {
  key: string;
  name: string;
  /** Fixed velocity heads. */
  K?: number;
  /** Equivalent length in diameters: K = f_T · diameters. */
  diameters?: number;
  twoK?: { K1: number; Kinf: number };
  threeK?: { K1: number; Ki: number; Kd: number };
};

/** Where each family of figures comes from. */
export const FITTING_SOURCES = {
  length:
    'Crane TP-410, equivalent lengths L/D (from memory of the handbook; the figures stand in many public tables)',
  K: 'Crane TP-410, entrances and exits (from memory); rupture disk: ASME VIII-1 UG-127 default KR 2.4 (from memory)',
  '2-K':
    'W. B. Hooper, Chemical Engineering, 24 Aug 1981, 96–100, as read in a public fluid-mechanics library',
  '3-K':
    'P. Silverberg and R. Darby, Chemical Engineering, July 1999, 101, as read in a public fluid-mechanics library',
} as const;

const two = (K1: number, Kinf: number) => ({ K1, Kinf });
const three = (K1: number, Ki: number, Kd: number) => ({ K1, Ki, Kd });

/** The library, in the order in which a line meets them. */
export const FITTINGS: readonly Fitting[] = [
  { key: 'entrance-sharp', name: 'entrance, sharp', K: 0.5 },
  { key: 'entrance-projecting', name: 'entrance, inward projecting', K: 0.78 },
  { key: 'entrance-rounded', name: 'entrance, well rounded (r/d 0.15 and more)', K: 0.04 },
  { key: 'exit', name: 'exit into a vessel or header', K: 1 },
  { key: 'rupture-disk', name: 'rupture disk, no certified flow resistance', K: 2.4 },
  {
    key: 'elbow-90-screwed',
    name: 'elbow 90, standard, screwed',
    diameters: 30,
    twoK: two(800, 0.4),
    threeK: three(800, 0.14, 4),
  },
  {
    key: 'elbow-90-standard',
    name: 'elbow 90, standard, flanged or welded (r/D 1)',
    diameters: 20,
    twoK: two(800, 0.25),
    threeK: three(800, 0.091, 4),
  },
  {
    key: 'elbow-90-long',
    name: 'elbow 90 long radius',
    diameters: 14,
    twoK: two(800, 0.2),
    threeK: three(800, 0.071, 4.2),
  },
  {
    key: 'elbow-90-mitre-1',
    name: 'elbow 90, mitred, one weld',
    diameters: 60,
    twoK: two(1000, 1.15),
    threeK: three(1000, 0.27, 4),
  },
  {
    key: 'elbow-90-mitre-2',
    name: 'elbow 90, mitred, two welds',
    twoK: two(800, 0.35),
    threeK: three(800, 0.068, 4.1),
  },
  {
    key: 'elbow-90-mitre-3',
    name: 'elbow 90, mitred, three welds',
    twoK: two(800, 0.3),
    threeK: three(800, 0.035, 4.2),
  },
  {
    key: 'elbow-45-standard',
    name: 'elbow 45, standard (r/D 1)',
    diameters: 16,
    twoK: two(500, 0.2),
    threeK: three(500, 0.071, 4.2),
  },
  {
    key: 'elbow-45-long',
    name: 'elbow 45 long radius',
    twoK: two(500, 0.15),
    threeK: three(500, 0.052, 4),
  },
  {
    key: 'elbow-45-mitre-1',
    name: 'elbow 45, mitred, one weld',
    diameters: 15,
    twoK: two(500, 0.25),
    threeK: three(500, 0.086, 4),
  },
  {
    key: 'return-180-flanged',
    name: 'return bend 180, flanged or welded (r/D 1)',
    diameters: 50,
    twoK: two(1000, 0.35),
    threeK: three(1000, 0.12, 4),
  },
  {
    key: 'return-180-long',
    name: 'return bend 180 long radius',
    twoK: two(1000, 0.3),
    threeK: three(1000, 0.1, 4),
  },
  {
    key: 'tee-run',
    name: 'tee, through run',
    diameters: 20,
    twoK: two(150, 0.05),
    threeK: three(150, 0.05, 4),
  },
  {
    key: 'tee-branch',
    name: 'tee, into branch',
    diameters: 60,
    twoK: two(800, 0.8),
    threeK: three(800, 0.28, 4),
  },
  {
    key: 'tee-stub-branch',
    name: 'stub-in tee, into branch',
    twoK: two(1000, 1),
    threeK: three(1000, 0.34, 4),
  },
  {
    key: 'gate-full',
    name: 'gate valve, full bore',
    diameters: 8,
    twoK: two(300, 0.1),
    threeK: three(300, 0.037, 3.9),
  },
  {
    key: 'ball-full',
    name: 'ball valve, full bore',
    diameters: 3,
    twoK: two(300, 0.1),
    threeK: three(300, 0.017, 3.5),
  },
  {
    key: 'plug-straight',
    name: 'plug valve, straight way',
    diameters: 18,
    threeK: three(300, 0.084, 3.9),
  },
  {
    key: 'plug-three-way',
    name: 'plug valve, three-way, straight through',
    diameters: 30,
    threeK: three(300, 0.14, 4),
  },
  {
    key: 'plug-three-way-branch',
    name: 'plug valve, three-way, into branch',
    diameters: 90,
    threeK: three(500, 0.41, 4),
  },
  {
    key: 'globe',
    name: 'globe valve',
    diameters: 340,
    twoK: two(1500, 4),
    threeK: three(1500, 1.7, 3.6),
  },
  {
    key: 'angle-90',
    name: 'angle valve',
    diameters: 150,
    twoK: two(1000, 2),
    threeK: three(1000, 0.69, 4),
  },
  { key: 'butterfly', name: 'butterfly valve', diameters: 45, twoK: two(800, 0.25) },
  {
    key: 'check-swing',
    name: 'check valve, swing',
    diameters: 100,
    twoK: two(1500, 1.5),
    threeK: three(1500, 0.46, 4),
  },
  {
    key: 'check-lift',
    name: 'check valve, lift',
    diameters: 600,
    twoK: two(2000, 10),
    threeK: three(2000, 2.85, 3.8),
  },
];
