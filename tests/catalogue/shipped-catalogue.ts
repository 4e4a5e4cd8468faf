import { join } from 'node:path'
import { openCatalogue, readCatalogue } from '#backend/catalogue-db.ts'
import type { Catalogue } from '#catalogue/types.ts'

/** What ships, as the program reads it. */
export function shippedCatalogue(): Catalogue {
  const db = openCatalogue(':memory:', join(import.meta.dirname, '..', '..', 'db'))
  try {
    return readCatalogue(db)
  } finally {
    db.close()
  }
}
