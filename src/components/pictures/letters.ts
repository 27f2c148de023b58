/* Places orifice letters along a ruler: letters that would crowd are drawn as one range, "D–G". */

export type LetterAt = { letter: string; x: number; kept: boolean };
export type LetterLabel = { label: string; x: number; kept?: string };

/** Width in pixels that a label needs, at 11 px type with air on both sides. */
function widthOf(label: string): number {
  return label.length === 1 ? 11 : 27;
}

function labelOf(run: LetterAt[]): string {
  const first = run[0]?.letter ?? '';
  const last = run.at(-1)?.letter ?? '';
  return first === last ? first : `${first}–${last}`;
}

function middle(run: LetterAt[]): number {
  return ((run[0]?.x ?? 0) + (run.at(-1)?.x ?? 0)) / 2;
}

function crowds(left: LetterAt[], right: LetterAt[]): boolean {
  return middle(right) - middle(left) < (widthOf(labelOf(left)) + widthOf(labelOf(right))) / 2;
}

/**
 * Groups neighbours that would overlap, left to right, until none does; kept letters (installed, present) stay alone
 * and crowd out the labels beside them.
 */
export function placeLetters(letters: LetterAt[]): LetterLabel[] {
  const runs: LetterAt[][] = [];
  for (const at of [...letters].sort((a, b) => a.x - b.x)) {
    let run = [at];
    for (
      let last = runs.at(-1);
      last && !at.kept && !last[0]?.kept && crowds(last, run);
      last = runs.at(-1)
    ) {
      run = [...last, ...run];
      runs.pop();
    }
    runs.push(run);
  }
  return runs
    .filter((run, i) => {
      if (run[0]?.kept) return true;
      const beside = [runs[i - 1], runs[i + 1]].filter((other) => other?.[0]?.kept);
      return !beside.some(
        (other) => other && (middle(other) > middle(run) ? crowds(run, other) : crowds(other, run)),
      );
    })
    .map((run) => ({
      label: labelOf(run),
      x: middle(run),
      ...(run[0]?.kept ? { kept: run[0].letter } : {}),
    }));
}
