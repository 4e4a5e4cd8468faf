/** A number's name says its unit: `surfaceTempC`, never `surfaceTemp`. */
import { readdirSync } from 'node:fs'
import { join, resolve } from 'node:path'
import ts from 'typescript'
import { describe, expect, test } from 'vitest'

const layers = ['solver', 'sizing', 'money', 'touch', 'model', 'catalogue']
const bare =
  /(^|[a-z0-9])(temp|temperature|thickness|diameter|pressure|conductivity|speed|loss|length|height|width|area|density)$/i

/** Numbers that have no unit to name. */
const unitless = new Map([
  ['src/model/fields.ts maxLength', 'counts characters, as in HTML'],
  ['src/solver/root.ts width', 'is in whatever unit the argument of the function has'],
])

const program = resolve(import.meta.dirname, '..')

/** Parameters, properties and fields typed as numbers whose names end without a unit. */
function namesWithoutUnit(files: readonly string[]): string[] {
  const project = ts.createProgram([...files], {
    target: ts.ScriptTarget.ES2024,
    module: ts.ModuleKind.ESNext,
    moduleResolution: ts.ModuleResolutionKind.Bundler,
    allowImportingTsExtensions: true,
    noEmit: true,
    strict: true,
    skipLibCheck: true,
    types: [],
  })
  const checker = project.getTypeChecker()
  const found: string[] = []
  for (const file of files) {
    const source = project.getSourceFile(file)
    if (source) visit(source, source)
  }
  return found

  function visit(node: ts.Node, source: ts.SourceFile): void {
    if (isNamed(node) && bare.test(node.name.text) && isNumber(node)) {
      const { line } = source.getLineAndCharacterOfPosition(node.name.getStart())
      found.push(`${source.fileName}:${line + 1} ${node.name.text}`)
    }
    ts.forEachChild(node, (child) => visit(child, source))
  }

  function isNumber(node: ts.Node): boolean {
    const type = checker.getNonNullableType(checker.getTypeAtLocation(node))
    const parts = type.isUnion() ? type.types : [type]
    return parts.some((part) => (part.flags & ts.TypeFlags.NumberLike) !== 0)
  }
}

type Named = (ts.ParameterDeclaration | ts.PropertySignature | ts.PropertyDeclaration) & {
  readonly name: ts.Identifier
}

const isNamed = (node: ts.Node): node is Named =>
  (ts.isParameter(node) || ts.isPropertySignature(node) || ts.isPropertyDeclaration(node)) &&
  ts.isIdentifier(node.name)

function sourcesOf(layer: string): string[] {
  const folder = join(program, 'src', layer)
  const names = readdirSync(folder, { recursive: true, encoding: 'utf8' })
  return names.filter((name) => name.endsWith('.ts')).map((name) => join(folder, name))
}

describe('the name of a number ends with its unit', () => {
  // One program for all: the type checker reads what they share once.
  const found = namesWithoutUnit(layers.flatMap(sourcesOf))
  test.each(layers)('in src/%s', (layer) => {
    const mine = found
      .map((place) => place.slice(program.length + 1))
      .filter((place) => place.startsWith(`src/${layer}/`))
      .filter((place) => !unitless.has(place.replace(/:\d+/, '')))
    expect(mine).toEqual([])
  })
})

test('a name without its unit is found wherever it stands', () => {
  expect(namesWithoutUnit([join(program, 'tests/fixtures/names-without-unit.ts')])).toEqual(
    ['temp', 'pipeDiameter', 'heatLoss', 'width', 'maybeLength'].map((name) =>
      expect.stringMatching(new RegExp(`:\\d+ ${name}$`)),
    ),
  )
})
