/** Prints the JSON Schema of `size --json`: `npm run schema`. */
import { sizedJsonSchema } from '#report/run-result-schema.ts'

process.stdout.write(`${JSON.stringify(sizedJsonSchema(), null, 2)}\n`)
