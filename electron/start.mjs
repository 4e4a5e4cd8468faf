// npm start: the desktop shell where it can be had, else the same program in a browser.
import './node-version.mjs'

const help = `Starts Lagwright: its window where the desktop shell can be had, else the same program in a browser.

  npm start -- [options]

  --browser  the browser at once
  --no-open  only print the address, open no browser
  --help     this text

For the command line see: npm run -s lagwright -- --help
`

const options = process.argv.slice(2)
const unknown = options.filter((option) => !['--browser', '--no-open'].includes(option))
if (options.includes('--help') || options.includes('-h')) {
  process.stdout.write(help)
} else if (unknown.length > 0) {
  process.stderr.write(
    `Unknown: ${unknown.join(' ')}. Known are --browser, --no-open and --help.\n`,
  )
  process.exitCode = 2
} else {
  // Loaded only now, so that an old Node has had its one line and never comes here.
  const { start } = await import('./launch.mjs')
  await start(options)
}
