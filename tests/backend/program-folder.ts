import { join } from 'node:path'

/** The `db` folder of the program under test. */
export const dbFolder = join(import.meta.dirname, '..', '..', 'db')
export const catalogueMigrations = join(dbFolder, 'migrations')
export const jobMigrations = join(dbFolder, 'job')
