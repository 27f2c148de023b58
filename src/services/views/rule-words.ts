/* A rule of the rulebook in words, for readers who know the matter and not its code. */
import { ruleOf } from '@domain/rulebook';

export type RuleWords = { name: string; statement: string; href: string };

const CAPITALS: Record<string, string> = { mawp: 'MAWP', cdtp: 'CDTP', en: 'EN', z: 'Z', k: 'k' };

/** The name of a rule: its code as words. */
export function ruleName(code: string): string {
  const words = code.split('-').map((word) => CAPITALS[word] ?? word);
  const name = words.join(' ');
  return code.startsWith('k-') ? name : name.charAt(0).toUpperCase() + name.slice(1);
}

/** A rule by its name, its statement and its place in the rulebook of a site. */
export function ruleWords(site: string, code: string): RuleWords {
  return {
    name: ruleName(code),
    statement: (ruleOf(code)?.statement ?? ruleName(code)).replaceAll(/\{\w+\}/g, '…'),
    href: `/s/${site}/rulebook#${code}`,
  };
}
