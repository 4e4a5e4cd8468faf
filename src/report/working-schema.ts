/** The schema of what `working --json` writes; `npm run schema -- working` prints it as JSON Schema. */
import { z } from 'zod'
import type { Working } from '#sizing/working/types.ts'
import { type Caution, cautions } from './cautions.ts'
import { caution, type IsSame, text } from './schema-parts.ts'

const figureFields = {
  symbol: text('Symbol, of one meaning within its section'),
  value: z.number().describe('As calculated, unrounded, in `unit`'),
  printed: text('As printed, with the digits that the lines which use it need'),
  unit: text('Unit; empty for a bare number'),
}
const figure = z
  .strictObject(figureFields)
  .meta({ id: 'Figure', description: 'A number as it stands on the page' })

const step = z
  .strictObject({
    ...figureFields,
    words: text('What the line is'),
    formula: z
      .string()
      .nullable()
      .describe('In symbols: numbers, + − × / ^ ( ) ln exp sqrt cbrt abs min max π; null if given'),
    inputs: z.array(figure).describe('What the symbols of the formula stand for'),
    source: z.string().nullable().describe('Where the formula or figure comes from'),
    validity: z.string().nullable().describe('Where the formula holds, and whether it does here'),
  })
  .meta({ id: 'Step', description: 'One line of the calculation' })

const section = z
  .strictObject({
    title: text('What the section works out'),
    condition: z.string().nullable().describe('The design condition in words'),
    texts: z.array(z.string()).describe('What is said first'),
    steps: z.array(step),
    table: z
      .strictObject({ headers: z.array(z.string()), rows: z.array(z.array(z.string())) })
      .nullable(),
  })
  .meta({ id: 'Section', description: 'A part of the working that stands for itself' })

export const workingSchema = z
  .strictObject({
    tag: text('Tag of the run'),
    title: text('The run and the thickness that is worked out'),
    sections: z.array(section),
    cautions: z.array(caution),
  })
  .describe('What `lagwright working --json` writes')

/** The JSON Schema of a working. */
export function workingJsonSchema(): Record<string, unknown> {
  return { ...z.toJSONSchema(workingSchema), title: 'Lagwright: working of a run' }
}

export function writeWorkingJson(working: Working): string {
  return `${JSON.stringify({ ...working, cautions })}\n`
}

// The schema and the types say the same, both ways: the line fails to compile where they part.
interface Written extends Working {
  readonly cautions: readonly Caution[]
}
const schemaIsType: IsSame<z.output<typeof workingSchema>, Written> = true
void schemaIsType
