// npm run bench: what one solve and ladders of 10 000 runs cost on this machine.
//   --runs RUNS.csv   the runs of a list; without it, random ones over the whole input range
//   --json            one object on standard output and nothing else
import '../../electron/node-version.mjs'

// Loaded only now, so that an old Node has had its one line and never comes here.
const { bench } = await import('./bench.ts')
process.exitCode = await bench(process.argv.slice(2))
