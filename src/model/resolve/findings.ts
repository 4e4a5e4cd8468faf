import type { Issue, Note } from '#sizing/result.ts'
import { type FieldKey, fieldOf } from '../fields.ts'

/** Collects what is wrong with a run and what had to be assumed, while it is put together. */
export class Findings {
  readonly issues: Issue[] = []
  readonly notes: Note[] = []

  /** A fault of one value: what was found and what is allowed. */
  fault(key: FieldKey, found: string, allowed: string): void {
    this.issues.push({ column: fieldOf(key).column, found, allowed })
  }

  /** Something a reader of the result should know. */
  note(code: string, text: string): void {
    this.notes.push({ code, text })
  }
}

/** "a", "a and b", "a, b and c". */
export function listed(parts: readonly string[]): string {
  const last = parts.at(-1) ?? ''
  return parts.length < 2 ? last : `${parts.slice(0, -1).join(', ')} and ${last}`
}

/** A number as people read it, without trailing zeros. */
export const plain = (value: number, digits = 1): string =>
  String(Number(value.toFixed(digits))).replace('-', '−')
