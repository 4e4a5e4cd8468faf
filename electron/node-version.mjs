// Says in one line what an old Node is missing, before anything that it cannot even parse is loaded.
// The sources run as they are, as TypeScript, which Node does by itself from 22.18 on.
const [major = 0, minor = 0] = process.versions.node.split('.').map(Number)

if (major < 22 || (major === 22 && minor < 18)) {
  console.error(
    `Lagwright needs Node 22.18 or later; this is Node ${process.versions.node}. ` +
      'Install a newer one from nodejs.org, or start it by `npm run`, which brings its own on Linux (x64).',
  )
  process.exit(1)
}
