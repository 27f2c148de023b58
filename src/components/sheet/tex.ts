/* TeX of a calculation sheet as HTML, set on the server; MathML goes with it for those who listen. */
import katex from 'katex';

const KNOWN = new Map<string, string>();
const MOST = 4000;

/** Renders TeX, in a line or displayed. What cannot be set comes out as its source, in the colour of an error. */
export function texHtml(tex: string, display = false): string {
  const key = `${display ? 'd' : 'i'}${tex}`;
  const known = KNOWN.get(key);
  if (known !== undefined) return known;
  const html = katex.renderToString(tex, {
    displayMode: display,
    output: 'htmlAndMathml',
    throwOnError: false,
    errorColor: 'var(--oxide)',
    strict: false,
    trust: ({ command }) => command === '\\htmlClass',
    maxExpand: 200,
  });
  if (KNOWN.size >= MOST) KNOWN.clear();
  KNOWN.set(key, html);
  return html;
}

/** Splits "X = …" at its first equals sign that stands outside braces. */
function sides(tex: string): [string, string] | undefined {
  let depth = 0;
  for (let i = 0; i < tex.length; i++) {
    if (tex[i] === '{') depth++;
    else if (tex[i] === '}') depth--;
    else if (tex[i] === '=' && depth === 0) return [tex.slice(0, i).trim(), tex.slice(i + 1).trim()];
  }
  return undefined;
}

/** Equation above, substitution under its equals sign in second ink. */
export function equationTex(tex: string, worked: string): string {
  const equation = sides(tex);
  if (!equation) return tex;
  const [left, right] = equation;
  const figures = worked === tex ? undefined : (sides(worked)?.[1] ?? worked);
  const under = figures === undefined || figures === right ? '' : `\\\\[3pt]&\\htmlClass{sub}{{}=${figures}}`;
  return `\\begin{aligned}${left}&=${right}${under}\\end{aligned}`;
}
