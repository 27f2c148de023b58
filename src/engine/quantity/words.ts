/* The spellings people type for units, and how a typed spelling is brought to a key. */
import { UNITS } from './units';

/** Spellings beyond the keys and labels; already normalised (see `normaliseUnit`). */
const SPELLINGS: Record<string, string[]> = {
  bar_g: ['barg', 'bar g', 'bargauge', 'baru', 'barü'],
  bar_abs: ['bara', 'bar a', 'barabs', 'barabsolute'],
  mbar_g: ['mbarg', 'mbargauge'],
  mbar_abs: ['mbara', 'mbarabs'],
  kPa_g: ['kpag', 'kpagauge'],
  kPa_abs: ['kpaa', 'kpaabs', 'kpaabsolute'],
  MPa_g: ['mpag', 'mpagauge'],
  MPa_abs: ['mpaa', 'mpaabs'],
  Pa_g: ['pag'],
  Pa_abs: ['paa', 'paabs'],
  psig: ['psigauge', 'lbf/in2g', '#g'],
  psia: ['psiabs', 'psiabsolute', 'psiaabs'],
  psi: ['lbf/in2', 'psid'],
  inH2O_g: ['inh2og', 'inwg', 'inwcg'],
  inH2O: ['inwc', 'inchh2o'],
  degC: ['c', '°c', 'celsius', 'deg c', 'grad'],
  degF: ['f', '°f', 'fahrenheit'],
  degR: ['r', '°r', 'rankine'],
  K: ['k', 'kelvin', '°k'],
  'kg/h': ['kg/hr', 'kgh', 'kgph', 'kg/hour'],
  't/h': ['te/h', 'tonne/h', 'tph', 't/hr'],
  'lb/h': ['lb/hr', 'lbs/h', 'lbs/hr', 'pph', 'lbh', 'lbm/h', 'lbm/hr'],
  'm3/h': ['m3/hr', 'cbm/h', 'm3h', 'cum/h'],
  'L/min': ['l/min', 'lpm', 'ltr/min'],
  'US gpm': ['gpm', 'usgpm', 'gal/min', 'usgal/min'],
  'ft3/min': ['cfm', 'cuft/min'],
  SCFH: ['scfh', 'stdft3/h', 'cfhfreeair'],
  SCFM: ['scfm', 'stdft3/min'],
  'Nm3/h': ['nm3/hr', 'nm3h', 'm3n/h', 'm3(n)/h'],
  mm2: ['sqmm', 'qmm'],
  in2: ['sqin', 'inch2', 'insq'],
  ft2: ['sqft', 'ftsq'],
  m2: ['sqm', 'qm'],
  in: ['inch', 'inches', '"', '″'],
  ft: ['foot', 'feet', "'", '′'],
  m: ['metre', 'metres', 'meter', 'meters'],
  L: ['l', 'litre', 'litres', 'liter'],
  'US gal': ['gal', 'usgal', 'gallon'],
  'kg/kmol': ['kg/mol-k', 'kgkmol', 'g/gmol'],
  'lb/lbmol': ['lbm/lbmol'],
  'Btu/lb': ['btu/lbm'],
  'Btu/h': ['btu/hr', 'btuh'],
  'MMBtu/h': ['mmbtu/hr', 'mbtu/h'],
  'Btu/(lb.degF)': ['btu/lb.f', 'btu/lbf', 'btu/(lb.f)', 'btu/(lb°f)', 'btu/lb°f'],
  'Btu/(h.degF)': ['btu/h.f', 'btu/hr°f', 'btu/(h.f)', 'btu/h°f'],
  'J/(kg.K)': ['j/kgk', 'j/(kgk)', 'j/kg/k'],
  'kJ/(kg.K)': ['kj/kgk', 'kj/(kgk)', 'kj/kg/k'],
  'W/(m.K)': ['w/mk', 'w/(mk)', 'w/m/k'],
  'kg/m3': ['kg/cbm', 'kgm3'],
  'lb/ft3': ['lb/cuft', 'pcf', 'lbm/ft3'],
  cP: ['cps', 'centipoise'],
  'mPa.s': ['mpas'],
  'Pa.s': ['pas'],
  SUS: ['ssu', 'sayboltseconds'],
  '1/K': ['k-1', '/k', 'perk'],
  '1/degF': ['/f', '/°f', '1/f', '1/°f', 'perf'],
  'm/s': ['mps'],
  s: ['sec', 'seconds'],
  min: ['mins', 'minutes'],
  h: ['hr', 'hrs', 'hours', 'hour'],
  d: ['day', 'days'],
  weeks: ['week', 'wk'],
  months: ['month', 'mo', 'mth'],
  years: ['year', 'yr', 'yrs', 'a'],
  deg: ['degree', 'degrees'],
  rpm: ['1/min', 'r/min', 'u/min'],
  '%': ['percent', 'pct', 'pc'],
  '% of set': ['%ofset', '%set', 'percentofset'],
};

/** Brings a typed unit to a comparable spelling: superscripts, dots, brackets of gauge and absolute, spaces, case. */
export function normaliseUnit(text: string): string {
  return text
    .trim()
    .replace(/²/g, '2')
    .replace(/³/g, '3')
    .replace(/₂/g, '2')
    .replace(/[·*]/g, '.')
    .replace(/\^/g, '')
    .replace(/[\s\u00a0\u2009\u202f_]+/g, '')
    .toLowerCase()
    .replace(/\((g|a|gauge|abs|absolute)\)/g, '$1')
    .replace(/^deg\.?([cfr])$/, '°$1')
    .replace(/\.(?=[gas]$)/g, (dot) => dot);
}

/** Normalised spelling → unit key; the first unit that claims a spelling keeps it. */
const BY_SPELLING: ReadonlyMap<string, string> = buildSpellings();

function buildSpellings(): Map<string, string> {
  const map = new Map<string, string>();
  const claim = (word: string, key: string) => {
    const spelling = normaliseUnit(word);
    if (spelling !== '' && !map.has(spelling)) map.set(spelling, key);
  };
  for (const key of Object.keys(UNITS)) claim(key, key);
  for (const [key, words] of Object.entries(SPELLINGS)) for (const word of words) claim(word, key);
  for (const [key, unit] of Object.entries(UNITS))
    if (!key.startsWith('d') || key.length > 2) claim(unit.label, key);
  return map;
}

/** The unit key for what somebody typed as a unit, or undefined. */
export function unitFromWords(text: string): string | undefined {
  return BY_SPELLING.get(normaliseUnit(text));
}
