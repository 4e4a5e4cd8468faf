/** What a person may have meant: used where a name or a size is not in the catalogue. */

/** Name without case, spaces and joining marks, so that `Stone wool` finds `stone_wool`. */
export function bareName(text: string): string {
  return text
    .normalize('NFKC')
    .toLowerCase()
    .replace(/[\s_\-–./()]+/g, '')
}

/** Up to `count` names close to the text, best first; none where nothing is close. */
export function closeNames(text: string, names: readonly string[], count = 3): string[] {
  const wanted = bareName(text)
  if (wanted === '') return []
  return names
    .map((name) => ({
      name,
      cost: Math.min(cost(wanted, bareName(name)), sharesWord(text, name) ? 0.45 : 1),
    }))
    .filter(({ cost }) => cost <= 0.5)
    .sort((a, b) => a.cost - b.cost)
    .slice(0, count)
    .map(({ name }) => name)
}

/** The values just below and just above. */
export function neighbours(value: number, values: readonly number[]): number[] {
  const below = values.filter((candidate) => candidate <= value)
  const above = values.filter((candidate) => candidate > value)
  return [
    ...(below.length > 0 ? [Math.max(...below)] : []),
    ...(above.length > 0 ? [Math.min(...above)] : []),
  ]
}

/** 0 the same, below 0.5 similar: a part of the name counts as close, else letters changed per letter typed. */
function cost(wanted: string, name: string): number {
  if (wanted.length > 2 && name.includes(wanted)) return 0.2 - wanted.length / name.length / 10
  if (name.length > 2 && wanted.includes(name)) return 0.3
  return editDistance(wanted, name) / Math.max(wanted.length, name.length)
}

/** A long word in common: `mineral wool` is close to `Glass wool slab`. */
function sharesWord(text: string, name: string): boolean {
  const words = (of: string): string[] => [...(of.toLowerCase().match(/[\p{L}\d]{4,}/gu) ?? [])]
  return words(text.slice(0, 200)).some((word) => words(name).includes(word))
}

/** Letters to add, drop or change (Levenshtein). Texts are cut at 60 letters: a pasted page must not cost time. */
function editDistance(a: string, b: string): number {
  const from = a.slice(0, 60)
  const to = b.slice(0, 60)
  let previous = Array.from({ length: to.length + 1 }, (_, j) => j)
  for (let i = 1; i <= from.length; i += 1) {
    const row = [i]
    for (let j = 1; j <= to.length; j += 1) {
      const change = (previous[j - 1] ?? 0) + (from[i - 1] === to[j - 1] ? 0 : 1)
      row.push(Math.min(change, (previous[j] ?? 0) + 1, (row[j - 1] ?? 0) + 1))
    }
    previous = row
  }
  return previous[to.length] ?? 0
}
