// npm start: the desktop shell where it can be had, else the same program in a browser.
//   --browser  the browser at once     --no-open  only print the address
import './node-version.mjs'

// Loaded only now, so that an old Node has had its one line and never comes here.
const { start } = await import('./launch.mjs')
await start(process.argv.slice(2))
