// npm run published: runs the tests that compare with print and renews tests/published/REPORT.md from what they find.
import '../../electron/node-version.mjs'

// Loaded only now, so that an old Node has had its one line and never comes here.
const { renewPublished } = await import('../runner/published.ts')
process.exitCode = await renewPublished()
