/** What stands under every table: the notes, each once with the runs it belongs to, and the cautions. */
import { cautions } from './cautions.ts'

export interface NotedRun {
  readonly tag: string
  readonly notes: readonly string[]
}

export function noteLines(runs: readonly NotedRun[]): readonly string[] {
  const tagsOf = new Map<string, string[]>()
  for (const { tag, notes } of runs) {
    for (const text of notes) {
      const tags = tagsOf.get(text)
      if (tags) tags.push(tag)
      else tagsOf.set(text, [tag])
    }
  }
  if (tagsOf.size === 0) return []
  const who = (tags: readonly string[]) =>
    tags.length === runs.length ? 'all runs' : tagList(tags)
  return ['Notes', ...Array.from(tagsOf, ([text, tags]) => `- ${text} (${who(tags)})`)]
}

export function tagList(tags: readonly string[]): string {
  const most = 8
  const more = tags.length - most
  return more > 0 ? `${tags.slice(0, most).join(', ')} and ${more} more` : tags.join(', ')
}

export function cautionLines(): readonly string[] {
  return ['Cautions', ...cautions.map(({ text, deferTo }) => `- ${text} In doubt: ${deferTo}.`)]
}

/** Parts one under the other with a line between; empty ones are left out. */
export function inParts(parts: readonly (readonly string[])[]): string {
  const there = parts.filter((part) => part.length > 0)
  return `${there.map((part) => part.join('\n')).join('\n\n')}\n`
}
