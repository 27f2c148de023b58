/* Where a session runs, read roughly out of what the browser says of itself. */

/* The order matters: most browsers also name the ones that they descend from. */
const BROWSERS: [RegExp, string][] = [
  [/Edg(e|A|iOS)?\//, 'Edge'],
  [/OPR\//, 'Opera'],
  [/SamsungBrowser\//, 'Samsung Internet'],
  [/Firefox\/|FxiOS\//, 'Firefox'],
  [/Chrome\/|CriOS\/|Chromium\//, 'Chrome'],
  [/Safari\//, 'Safari'],
];
const SYSTEMS: [RegExp, string][] = [
  [/Android/, 'Android'],
  [/iPhone|iPad/, 'iOS'],
  [/Windows/, 'Windows'],
  [/Mac OS X|Macintosh/, 'macOS'],
  [/CrOS/, 'ChromeOS'],
  [/Linux/, 'Linux'],
];

const found = (agent: string, names: [RegExp, string][]) => names.find(([sign]) => sign.test(agent))?.[1];

/** `Firefox on Linux`; a program is named by its first word, silence is `an unnamed program`. */
export function agentWords(agent: string): string {
  const browser = found(agent, BROWSERS);
  const system = found(agent, SYSTEMS);
  if (browser !== undefined) return system === undefined ? browser : `${browser} on ${system}`;
  const word = agent.trim().split(/[\s/]/)[0] ?? '';
  return word === '' ? 'an unnamed program' : `the program ${word.slice(0, 40)}`;
}
