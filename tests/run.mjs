// npm test: every check and every test, closed by one line `N passed, N failed`.
// npm run check: the checks alone.
import '../electron/node-version.mjs'

// Loaded only now, so that an old Node has had its one line and never comes here.
const { run } = await import('./runner/run.ts')
process.exitCode = await run(process.argv.includes('check') ? 'checks' : 'everything')
