/** Keys that work everywhere in the window. A browser keeps Ctrl N for itself: there it is Alt N. */
import type { Workspace } from '#ui/state/workspace.svelte.ts'
import { type PlaceName, places } from './places.ts'

/** Does what the key asks for; returns whether it was one of these. */
export function windowKey(
  workspace: Workspace,
  go: (place: PlaceName) => void,
  event: KeyboardEvent,
): boolean {
  if (workspace.question) return false
  const { key, altKey, shiftKey } = event
  if (altKey && !shiftKey) return altKeyFor(workspace, go, key)
  if (!(event.ctrlKey || event.metaKey)) return false
  // In a field that is being typed in, undo is the field's own.
  if (isTyping(event) && ['z', 'y'].includes(key.toLowerCase())) return false
  const act = controlKeys[`${shiftKey ? 'shift ' : ''}${key.toLowerCase()}`]
  act?.(workspace)
  return act !== undefined
}

const controlKeys: Readonly<Record<string, (workspace: Workspace) => void>> = {
  z: ({ session }) => session.undo(),
  'shift z': ({ session }) => session.redo(),
  y: ({ session }) => session.redo(),
  s: (workspace) => workspace.save(),
  'shift s': (workspace) => workspace.saveAs(),
  o: (workspace) => workspace.openJob(),
  n: (workspace) => workspace.newJob(),
  // The browser's own search sees only the lines that are drawn.
  f: () => document.querySelector<HTMLInputElement>('main input[type="search"]')?.select(),
}

function altKeyFor(workspace: Workspace, go: (place: PlaceName) => void, key: string): boolean {
  const place = places[Number(key) - 1]
  if (place) go(place.name)
  else if (key.toLowerCase() === 'n') workspace.newJob()
  else return false
  return true
}

/** A text field with something of its own to undo: one that differs from what it held. */
function isTyping({ target }: KeyboardEvent): boolean {
  return (
    target instanceof HTMLInputElement &&
    target.type !== 'radio' &&
    target.value !== target.defaultValue
  )
}
