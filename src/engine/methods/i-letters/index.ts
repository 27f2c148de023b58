/* The public face of the orifice letters. */
export { areaOf, chooseLetter, type Orifice, ORIFICE_LETTERS, orificeByLetter } from './letters';
