/* Where the data of the library comes from: every datum names one of these keys. */

/** The sources by key, as a sheet prints them. */
export const FLUID_SOURCES = {
  tcpr: 'Pina-Martinez, Le Guennec, Privat, Jaubert and Mathias (2018), J. Chem. Eng. Data 63, 3980: translated and consistent Peng–Robinson (critical point, Twu L, M, N, translation), as carried by the Python package thermo 0.6.1',
  bell: 'Bell, Satyro and Lemmon (2018), J. Chem. Eng. Data 63, 2402: consistent Twu parameters, as carried by the Python package thermo 0.6.1',
  trc: 'TRC gas heat capacities (Kabo and Roganov 1994), as carried by the Python package chemicals 1.5.2; refitted here to a polynomial within 0.5 % over the stated range',
  joback:
    'Joback group contributions (Poling, Prausnitz and O’Connell 2001), by the Python package chemicals 1.5.2: an estimate',
  monatomic: 'Monatomic gas: 5/2 R',
  coolprop:
    'Reference equation of state, by the Python package CoolProp 8.0.0; Z_RA was worked from its liquid density at 0.7 of the critical temperature, heat capacities refitted to a polynomial',
  crc: 'CRC Handbook of Chemistry and Physics, as carried by the Python package chemicals 1.5.2',
  psrk: 'Horstmann et al. (2005), appendix to PSRK revision 4, as carried by the Python package chemicals 1.5.2',
  weights: 'From the formula and the standard atomic weights (IUPAC), by the Python package chemicals 1.5.2',
  zra: 'Z_RA of the set of Hankinson and Thomson (1979), AIChE J. 25, 653, as carried by the Python package chemicals 1.5.2',
  perry:
    'Perry’s Chemical Engineers’ Handbook, 8th edition, viscosities (tables 2-312 and 2-313) and liquid densities, as carried by the Python package chemicals 1.5.2; Z_RA was worked from the density at 0.7 of the critical temperature',
} as const;

/** The key of a source of fluid data. */
export type SourceKey = keyof typeof FLUID_SOURCES;

/** Where the binary interaction parameters come from. */
export const BINARY_SOURCE =
  'Peng–Robinson k_ij regressed from vapour–liquid equilibria (after Knapp et al. 1982, DECHEMA Chemistry Data Series VI), the open ChemSep set as carried by the Python package thermo 0.6.1; they were regressed with the alpha function of 1976';
