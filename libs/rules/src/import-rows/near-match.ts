/** A name as it stands in our lists: lower case, words joined by `_`. */
const normalised = (text: string): string =>
  text
    .trim()
    .toLowerCase()
    .replace(/[^\p{L}\p{N}]+/gu, '_')
    .replace(/^_+|_+$/g, '');

/** The one choice that a mistyped word most likely stands for, or null when none is near or several are alike. */
export function nearMatch(text: string, choices: readonly string[]): string | null {
  const word = normalised(text);
  if (word === '' || word.length > 60) return null;
  const ranked = choices
    .map((choice) => ({ choice, distance: editDistance(word, normalised(choice)) }))
    .toSorted((a, b) => a.distance - b.distance);
  const [best, second] = ranked;
  if (!best) return null;
  const isNear = best.distance <= Math.max(1, Math.floor(word.length / 5));
  if (isNear && best.distance < (second?.distance ?? Infinity)) return best.choice;
  const holding = word.length >= 4 ? choices.filter((choice) => normalised(choice).includes(word)) : [];
  return holding.length === 1 ? holding[0]! : null;
}

/** Levenshtein's distance: how many characters to add, drop or change. */
function editDistance(a: string, b: string): number {
  let previous = Array.from({ length: b.length + 1 }, (_, index) => index);
  for (let i = 1; i <= a.length; i += 1) {
    const current = [i];
    for (let j = 1; j <= b.length; j += 1) {
      const change = previous[j - 1]! + (a[i - 1] === b[j - 1] ? 0 : 1);
      current.push(Math.min(previous[j]! + 1, current[j - 1]! + 1, change));
    }
    previous = current;
  }
  return previous[b.length]!;
}
