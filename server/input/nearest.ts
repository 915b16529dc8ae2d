/**
 * The known name that a misspelt one most likely meant: the fewest letters inserted, left out, replaced or
 * swapped with a neighbour (optimal string alignment distance), at most a third of the longer name.
 *
 * @returns the nearest name, the first of `known` when several are as near; undefined when none is near
 */
export function nearest(name: string, known: Iterable<string>): string | undefined {
  let best: string | undefined;
  let bestDistance = Number.POSITIVE_INFINITY;
  for (const candidate of known) {
    const allowed = Math.max(1, Math.floor(Math.max(name.length, candidate.length) / 3));
    // The difference in length is a lower bound; it also spares the table for absurdly long names.
    if (Math.abs(name.length - candidate.length) > allowed) continue;
    const distance = editDistance(name.toLowerCase(), candidate.toLowerCase());
    if (distance <= allowed && distance < bestDistance) {
      best = candidate;
      bestDistance = distance;
    }
  }
  return best;
}

/** `; did you mean "…"?` when a known name is near, else nothing: the end of a sentence about a name. */
export function suggestion(name: string, known: Iterable<string>): string {
  const near = nearest(name, known);
  return near === undefined ? "" : `; did you mean "${near}"?`;
}

function editDistance(a: string, b: string): number {
  let beforeLast: number[] = [];
  let last = Array.from({ length: b.length + 1 }, (_, j) => j);
  for (let i = 1; i <= a.length; i++) {
    const row = [i];
    for (let j = 1; j <= b.length; j++) {
      const replaced = at(last, j - 1) + (a[i - 1] === b[j - 1] ? 0 : 1);
      let least = Math.min(at(last, j) + 1, at(row, j - 1) + 1, replaced);
      if (i > 1 && j > 1 && a[i - 1] === b[j - 2] && a[i - 2] === b[j - 1]) {
        least = Math.min(least, at(beforeLast, j - 2) + 1);
      }
      row.push(least);
    }
    beforeLast = last;
    last = row;
  }
  return at(last, b.length);
}

function at(row: readonly number[], index: number): number {
  return row[index] ?? Number.POSITIVE_INFINITY;
}
