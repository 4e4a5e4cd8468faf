/** Prints the JSON Schema of `--json` of a command, `size` where none is named: `npm run schema -- loss`. */
import { lossJsonSchema } from '#report/loss-schema.ts'
import { sizedJsonSchema } from '#report/run-result-schema.ts'
import { workingJsonSchema } from '#report/working-schema.ts'
import { commandNames, isCommand } from './commands.ts'

const schemas = { size: sizedJsonSchema, loss: lossJsonSchema, working: workingJsonSchema }

const [word = 'size'] = process.argv.slice(2)
if (isCommand(word)) process.stdout.write(`${JSON.stringify(schemas[word](), null, 2)}\n`)
else {
  process.stderr.write(`found ${JSON.stringify(word)}; allowed: ${commandNames.join(', ')}\n`)
  process.exitCode = 2
}
