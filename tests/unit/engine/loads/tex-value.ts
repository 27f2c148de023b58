/* Works the right side of a step from its TeX alone, as a checker with a pocket calculator would. */

/** The equation cannot be worked from its print alone: it names a search, a curve, a geometry or a sum over steps. */
export const NOT_BY_HAND = /\\text|root|shell|head\}|Q\(|Q_s\(|\\sum|T_i|\\max_n/;

class Reader {
  private at = 0;
  constructor(private readonly s: string) {}

  /** The value of the whole text. */
  whole(): number {
    const value = this.sum();
    if (this.at < this.s.length) throw new Error(`unread: ${this.s.slice(this.at)}`);
    return value;
  }

  private peek(word: string): boolean {
    return this.s.startsWith(word, this.at);
  }

  private take(word: string): boolean {
    const here = this.peek(word);
    if (here) this.at += word.length;
    return here;
  }

  private sum(): number {
    let value = this.product();
    for (;;) {
      if (this.take('+')) value += this.product();
      else if (this.take('-')) value -= this.product();
      else return value;
    }
  }

  private product(): number {
    let value = this.power();
    for (;;) {
      if (this.take('*')) value *= this.power();
      else if (this.take('/')) value /= this.power();
      else if (/[\d.({[\\]/.test(this.s[this.at] ?? '')) value *= this.power();
      else return value;
    }
  }

  private power(): number {
    if (this.take('-')) return -this.power();
    if (this.take('+')) return this.power();
    const base = this.atom();
    return this.take('^') ? base ** this.atom(true) : base;
  }

  private list(): number[] {
    if (!this.take('(')) throw new Error('a list is missing');
    const values = [this.sum()];
    while (this.take(',')) values.push(this.sum());
    this.take(')');
    return values;
  }

  private group(open: string, close: string): number {
    if (!this.take(open)) throw new Error(`${open} is missing at ${this.s.slice(this.at)}`);
    const value = this.sum();
    if (!this.take(close)) throw new Error(`${close} is missing at ${this.s.slice(this.at)}`);
    return value;
  }

  private command(): number | undefined {
    if (this.take('\\frac')) return this.group('{', '}') / this.group('{', '}');
    if (this.take('\\sqrt')) return Math.sqrt(this.group('{', '}'));
    if (this.take('\\max')) return Math.max(...this.list());
    if (this.take('\\min')) return Math.min(...this.list());
    if (this.take('\\arccos')) return Math.acos(this.group('(', ')'));
    if (this.take('\\ln')) return Math.log(this.power());
    if (this.take('\\pi')) return Math.PI;
    return undefined;
  }

  private atom(single = false): number {
    const command = this.command();
    if (command !== undefined) return command;
    if (this.peek('(')) return this.group('(', ')');
    if (this.peek('[')) return this.group('[', ']');
    if (this.peek('{')) return this.group('{', '}');
    const digits = (single ? /^-?\d/ : /^\d*\.?\d+/).exec(this.s.slice(this.at))?.[0];
    if (digits === undefined) throw new Error(`no number at ${this.s.slice(this.at)}`);
    this.at += digits.length;
    return Number(digits);
  }
}

/** The value of the right side of a worked step: "Q = \\frac{{3}}{{4}}" is 0.75. */
export function texValue(worked: string): number {
  const right = worked.slice(worked.indexOf(' = ') + 3);
  const plain = right
    .replace(/\\(?:left|right|,|!)/g, '')
    .replace(/\\ /g, '')
    .replace(/\\tfrac/g, '\\frac')
    .replace(/\\cdot|\\times/g, '*')
    .replace(/\\frac(\d)(\d)/g, '\\frac{$1}{$2}')
    .replace(/\s+/g, '');
  return new Reader(plain).whole();
}
