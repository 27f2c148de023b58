/* The library of substances, and how one is found by any of its names. */
import { ALCOHOLS } from './substances/alcohols';
import { AROMATICS } from './substances/aromatics';
import { CHLORINATED } from './substances/chlorinated';
import { DIENES_ACETYLENES } from './substances/dienes-acetylenes';
import { ETHERS_OXIDES } from './substances/ethers-oxides';
import { HEAVY_ALKANES } from './substances/heavy-alkanes';
import { INORGANICS } from './substances/inorganics';
import { KETONES_ESTERS } from './substances/ketones-esters';
import { LIGHT_ALKANES } from './substances/light-alkanes';
import { OLEFINS } from './substances/olefins';
import { PERMANENT_GASES } from './substances/permanent-gases';
import { REFRIGERANTS } from './substances/refrigerants';
import { type Substance } from './substances/types';

/** Every substance of the library. */
export const SUBSTANCES: readonly Substance[] = [
  ...PERMANENT_GASES,
  ...LIGHT_ALKANES,
  ...HEAVY_ALKANES,
  ...OLEFINS,
  ...DIENES_ACETYLENES,
  ...AROMATICS,
  ...ALCOHOLS,
  ...KETONES_ESTERS,
  ...ETHERS_OXIDES,
  ...CHLORINATED,
  ...INORGANICS,
  ...REFRIGERANTS,
];

/** A name without case, spaces, hyphens and commas, so that `N-Butane`, `n butane` and `nbutane` are one. */
function plain(name: string): string {
  return name.toLowerCase().replace(/[\s,\-–_.]/g, '');
}

/** Names that are a formula of one substance only: `C4H10` finds nothing, `NH3` finds ammonia. */
function uniqueFormulae(): [string, Substance][] {
  const count = new Map<string, Substance[]>();
  for (const s of SUBSTANCES) count.set(s.formula, [...(count.get(s.formula) ?? []), s]);
  return [...count].flatMap(([formula, all]) =>
    all.length === 1 && all[0] !== undefined ? [[formula, all[0]] as [string, Substance]] : [],
  );
}

const BY_NAME: ReadonlyMap<string, Substance> = new Map(
  [
    ...uniqueFormulae(),
    ...SUBSTANCES.flatMap((s) =>
      [s.name, s.cas, ...s.aliases].map((name) => [name, s] as [string, Substance]),
    ),
  ].map(([name, s]) => [plain(name), s]),
);

/** The substance with this name, another usual name, its formula (where no isomer shares it) or its CAS number. */
export function findSubstance(name: string): Substance | undefined {
  return BY_NAME.get(plain(name));
}

/** Names of the library that share a word or a beginning with a name that was not found; at most five. */
export function similarNames(name: string): string[] {
  const wanted = plain(name);
  const start = wanted.slice(0, 4);
  const near = SUBSTANCES.filter((s) => {
    const own = plain(s.name);
    return (start.length > 1 && own.includes(start)) || (wanted.length > 3 && wanted.includes(own));
  });
  return near.slice(0, 5).map((s) => s.name);
}
