// npm run mutate [-- FOLDER …]: how many deliberate errors in a folder of src its tests notice.
import '../../electron/node-version.mjs'

// Loaded only now, so that an old Node has had its one line and never comes here.
const { mutate } = await import('./campaign.ts')
process.exitCode = await mutate(process.argv.slice(2))
