/* The public face of the pictures: pure functions that draw SVG as text, for pages, papers and tests. */
export { ladderSentence, pressureLadder, type Ladder } from './ladder';
export { type LadderState, type RungKey } from './ladder-scale';
export { miniRail, valve, verdictMark, VERDICT_WORDS, type GateState, type VerdictWord } from './marks';
export {
  orificeBar,
  orificeRuler,
  ratioBar,
  scaleMax,
  type BarFigures,
  type BarScale,
  type RatioFigures,
} from './orifice';
