/* Equations as a line of text, for paper that cannot set TeX: fractions with a slash, roots with their sign, Greek as letters. */

const SIGNS: Record<string, string> = {
  cdot: '·',
  times: '×',
  le: '≤',
  ge: '≥',
  ne: '≠',
  approx: '≈',
  pm: '±',
  infty: '∞',
  sum: '∑',
  int: '∫',
  to: '→',
  rightarrow: '→',
  alpha: 'α',
  beta: 'β',
  gamma: 'γ',
  delta: 'δ',
  epsilon: 'ε',
  varepsilon: 'ε',
  zeta: 'ζ',
  eta: 'η',
  theta: 'θ',
  kappa: 'κ',
  lambda: 'λ',
  mu: 'μ',
  nu: 'ν',
  xi: 'ξ',
  pi: 'π',
  rho: 'ρ',
  sigma: 'σ',
  tau: 'τ',
  phi: 'φ',
  varphi: 'φ',
  chi: 'χ',
  psi: 'ψ',
  omega: 'ω',
  Gamma: 'Γ',
  Delta: 'Δ',
  Theta: 'Θ',
  Lambda: 'Λ',
  Sigma: 'Σ',
  Phi: 'Φ',
  Psi: 'Ψ',
  Omega: 'Ω',
  ln: 'ln',
  log: 'log',
  exp: 'exp',
  max: 'max',
  min: 'min',
  sin: 'sin',
  cos: 'cos',
  tan: 'tan',
  arccos: 'arccos',
  lg: 'lg',
  quad: ' ',
  qquad: ' ',
  circ: '°',
  prime: '′',
  degree: '°',
  partial: '∂',
  dots: '…',
  ldots: '…',
};
/** Commands that only say how something is set: their argument stands for itself. */
const STYLES = new Set([
  'text',
  'mathrm',
  'mathit',
  'operatorname',
  'mathbf',
  'bar',
  'dot',
  'hat',
  'overline',
  'tfrac',
  'htmlClass',
]);
const SIMPLE = /^[\p{L}\p{N}_.′°]+$/u;

const inBrackets = (text: string) => (SIMPLE.test(text) ? text : `(${text})`);

/** Reads TeX from left to right; every group is read as a whole. */
class Reader {
  private at = 0;

  constructor(private readonly tex: string) {}

  /** Text up to the closing brace or the end. */
  line(): string {
    let text = '';
    while (this.at < this.tex.length && this.tex[this.at] !== '}') text += this.one();
    return text;
  }

  private group(): string {
    while (this.tex[this.at] === ' ') this.at += 1;
    if (this.tex[this.at] !== '{') return this.one();
    this.at += 1;
    const text = this.line();
    this.at += 1;
    return text.trim();
  }

  private one(): string {
    const sign = this.tex[this.at] ?? '';
    this.at += 1;
    if (sign === '\\') return this.command();
    if (sign === '{') {
      this.at -= 1;
      return this.group();
    }
    if (sign === '_') return `_${this.group().replace(/\s+/g, '')}`;
    if (sign === '^') return `^${inBrackets(this.group())}`;
    return sign === '&' || sign === '~' ? ' ' : sign;
  }

  private command(): string {
    const name = /^[A-Za-z]+/.exec(this.tex.slice(this.at))?.[0] ?? this.tex[this.at] ?? '';
    this.at += name.length;
    if (name === 'frac' || name === 'dfrac' || name === 'tfrac')
      return `${inBrackets(this.group())}/${inBrackets(this.group())}`;
    if (name === 'sqrt') return this.root();
    if (name === 'left' || name === 'right') return this.tex[this.at] === '.' ? ((this.at += 1), '') : '';
    if (name === 'begin' || name === 'end') return (this.group(), ' ');
    if (name === '\\') return '; ';
    if (STYLES.has(name)) return this.group();
    if (/^[A-Za-z]/.test(name))
      return `${SIGNS[name] ?? name}${/^(ln|log|exp|max|min|lg)$/.test(name) ? '\u00a0' : ''}`;
    return name === '%' || name === '{' || name === '}' ? name : ' ';
  }

  private root(): string {
    let index = '';
    if (this.tex[this.at] === '[') {
      const end = this.tex.indexOf(']', this.at);
      index = this.tex.slice(this.at + 1, end);
      this.at = end + 1;
    }
    return `${index}√${inBrackets(this.group())}`;
  }
}

/** TeX of a sheet as a line of text. Never throws; what it does not know stands by its name. */
export function plainTex(tex: string): string {
  let text = '';
  // A stray closing brace ends a line early: what follows it is read all the same.
  for (const part of [tex]) text += new Reader(part).line();
  return text.replace(/\s+/g, ' ').replace(/\( /g, '(').replace(/ \)/g, ')').trim();
}
