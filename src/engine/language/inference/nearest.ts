/**
 * Number of single-character edits between two words, two letters changed about counting as one
 * (optimal string alignment, after Damerau 1964); `limit` as soon as it is certain to be no less:
 * sheets have thousands of names.
 */
function editDistanceBelow(left: string, right: string, limit: number): number {
  if (Math.abs(left.length - right.length) >= limit) return limit;
  let before: number[] = [];
  let row = Array.from({ length: right.length + 1 }, (_, index) => index);
  for (let i = 1; i <= left.length; i += 1) {
    const next = [i];
    let least = i;
    for (let j = 1; j <= right.length; j += 1) {
      const substitution = (row[j - 1] ?? 0) + (left[i - 1] === right[j - 1] ? 0 : 1);
      let distance = Math.min(substitution, (row[j] ?? 0) + 1, (next[j - 1] ?? 0) + 1);
      if (i > 1 && j > 1 && left[i - 1] === right[j - 2] && left[i - 2] === right[j - 1])
        distance = Math.min(distance, (before[j - 2] ?? 0) + 1);
      next.push(distance);
      if (distance < least) least = distance;
    }
    // A change about reaches back over one row.
    if (least > limit) return limit;
    before = row;
    row = next;
  }
  return Math.min(limit, row[right.length] ?? 0);
}

/** Letters of a word as bits: two words that differ in more letters than twice the edits are far apart. */
function lettersOf(word: string): number {
  let bits = 0;
  for (let index = 0; index < word.length; index += 1) bits |= 1 << (word.charCodeAt(index) & 31);
  return bits;
}

function countBits(bits: number): number {
  let count = 0;
  for (let rest = bits; rest !== 0; rest &= rest - 1) count += 1;
  return count;
}

/**
 * The nearest of some names, when near enough to be a slip of the pen; of equally near ones the first
 * in the alphabet, so that their order does not matter.
 */
export function nearest(name: string, candidates: Iterable<string>): string | undefined {
  let best: string | undefined;
  // A third of the letters may differ, but never all of them.
  let least = Math.min(Math.max(1, Math.ceil(name.length / 3)), Math.max(name.length - 1, 0.5));
  const letters = lettersOf(name);
  for (const candidate of candidates) {
    if (candidate === name || Math.abs(candidate.length - name.length) > least) continue;
    if (countBits(letters ^ lettersOf(candidate)) > 2 * least) continue;
    // A difference of case alone is the likeliest slip.
    const isCase = candidate.toLowerCase() === name.toLowerCase();
    const distance = isCase ? 0.5 : editDistanceBelow(name, candidate, Math.floor(least) + 1);
    if (distance > least || (distance === least && best !== undefined && best < candidate)) continue;
    least = distance;
    best = candidate;
  }
  return best;
}
