/* The effective orifice areas by letter, and the letter for a required area. */
import { type System } from '../common/system';

/** One letter with its effective area as printed in both unit systems (they are not exact conversions). */
export type Orifice = { letter: string; in2: number; mm2: number };

/**
 * Effective areas. Source: API Standard 526, areas in in² as read in the open library CalebBell/fluids
 * (API526_A_sq_inch); the printed mm² areas are from memory of API 520/526.
 */
export const ORIFICE_LETTERS: readonly Orifice[] = [
  { letter: 'D', in2: 0.11, mm2: 71 },
  { letter: 'E', in2: 0.196, mm2: 126 },
  { letter: 'F', in2: 0.307, mm2: 198 },
  { letter: 'G', in2: 0.503, mm2: 325 },
  { letter: 'H', in2: 0.785, mm2: 506 },
  { letter: 'J', in2: 1.287, mm2: 830 },
  { letter: 'K', in2: 1.838, mm2: 1186 },
  { letter: 'L', in2: 2.853, mm2: 1841 },
  { letter: 'M', in2: 3.6, mm2: 2323 },
  { letter: 'N', in2: 4.34, mm2: 2800 },
  { letter: 'P', in2: 6.38, mm2: 4116 },
  { letter: 'Q', in2: 11.05, mm2: 7129 },
  { letter: 'R', in2: 16, mm2: 10323 },
  { letter: 'T', in2: 26, mm2: 16774 },
];

/** The printed effective area of an orifice in the system's unit. */
export function areaOf(orifice: Orifice, system: System): number {
  return system === 'US' ? orifice.in2 : orifice.mm2;
}

/** The smallest letter whose area is at least `area` (mm² or in²); undefined above T: more than one valve is needed. */
export function chooseLetter(area: number, system: System = 'SI'): Orifice | undefined {
  return ORIFICE_LETTERS.find((o) => areaOf(o, system) >= area);
}

/** The orifice of a letter, or undefined. */
export function orificeByLetter(letter: string): Orifice | undefined {
  return ORIFICE_LETTERS.find((o) => o.letter === letter);
}
