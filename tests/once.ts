/**
 * Works something out when it is first asked for, and keeps it. What several tests look at is then worked out within
 * the first of them: an error in it is that test's failure, not one of the whole file.
 */
export function once<T>(workOut: () => T): () => T {
  let kept: { readonly value: T } | null = null
  return () => {
    kept ??= { value: workOut() }
    return kept.value
  }
}
