// node tests/standin/run.mjs dist/main/main.cjs
// Runs the real bundled main process under Node: only the module `electron` is replaced.
import { registerHooks } from 'node:module'
import { resolve } from 'node:path'
import { pathToFileURL } from 'node:url'

const standIn = new URL('./electron.ts', import.meta.url).href
registerHooks({
  resolve: (name, context, next) =>
    name === 'electron'
      ? { url: standIn, format: 'module-typescript', shortCircuit: true }
      : next(name, context),
})
const slow = setTimeout(
  () => console.error('stand-in: main is still loading: does it await app.whenReady()?'),
  10_000,
)
await import(pathToFileURL(resolve(process.argv[2] ?? '')).href)
clearTimeout(slow)
const { app } = await import(standIn)
app.codeLoaded()
