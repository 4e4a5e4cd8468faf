/** What the test hands to the stand-in by its environment. */
const folder = process.env.STANDIN_FOLDER
if (!folder) throw new Error('The stand-in is started by tests/standin/launch.ts.')

/** Where Chromium keeps the page's storage, so that it outlives a restart. */
export const browserFolder = folder
export const isSecondInstance = process.env.STANDIN_SECOND_INSTANCE === '1'
