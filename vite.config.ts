// One `vite build` makes four bundles: the window, its preload script, Electron's main process and the
// loopback host. Everything but better-sqlite3 (a native module) is bundled.
import { builtinModules } from 'node:module'
import { fileURLToPath } from 'node:url'
import { svelte } from '@sveltejs/vite-plugin-svelte'
import { defineConfig, type EnvironmentOptions } from 'vite'

const at = (path: string): string => fileURLToPath(new URL(path, import.meta.url))
/** The licences of what is bundled, to travel with it. */
const license = { fileName: 'licenses.md' }
const browsers = ['chrome130', 'firefox128', 'safari18']

const nodeBundle = (name: string, input: string, format: 'es' | 'cjs'): EnvironmentOptions => ({
  consumer: 'server',
  resolve: { noExternal: true, external: ['electron', 'better-sqlite3', ...builtinModules] },
  build: {
    outDir: at(`dist/${name}`),
    emptyOutDir: true,
    target: 'node22',
    copyPublicDir: false,
    minify: false,
    sourcemap: true,
    license,
    rolldownOptions: {
      input: { [name]: at(input) },
      output: { format, entryFileNames: format === 'es' ? '[name].js' : '[name].cjs' },
    },
  },
})

export default defineConfig({
  root: at('src/ui'),
  base: './',
  publicDir: false,
  // One cache in the project's node_modules rather than one below src/ui.
  cacheDir: at('node_modules/.vite'),
  plugins: [svelte({ configFile: false })],
  worker: { format: 'es' },
  builder: {
    // Named one by one: left to itself Vite would also try its built-in `ssr` environment, and fail.
    async buildApp(builder) {
      for (const name of ['client', 'preload', 'main', 'host']) {
        const environment = builder.environments[name]
        if (environment) await builder.build(environment)
      }
    },
  },
  environments: {
    client: {
      build: {
        outDir: at('dist/ui'),
        emptyOutDir: true,
        target: browsers,
        // Data URLs and the preload polyfill's inline script would break the content security policy.
        assetsInlineLimit: 0,
        modulePreload: { polyfill: false },
        sourcemap: true,
        // The window comes from this machine's own disk, so one large file costs nothing.
        chunkSizeWarningLimit: 2000,
        license,
        rolldownOptions: { checks: { bundlerTimings: false } },
      },
    },
    // A sandboxed preload is one CommonJS file that requires nothing but `electron`.
    preload: {
      consumer: 'client',
      build: {
        outDir: at('dist/preload'),
        emptyOutDir: true,
        target: browsers,
        minify: false,
        copyPublicDir: false,
        rolldownOptions: {
          input: at('electron/preload.ts'),
          external: ['electron'],
          output: { format: 'cjs', entryFileNames: 'preload.cjs', codeSplitting: false },
        },
      },
    },
    // CommonJS, so that a top-level `await app.whenReady()`, which hangs Electron for ever, is a build error.
    main: nodeBundle('main', 'electron/main.ts', 'cjs'),
    host: nodeBundle('host', 'src/host/main.ts', 'es'),
  },
})
