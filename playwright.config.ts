import { defineConfig } from '@playwright/test'
import { chromiumLaunch } from './tests/chromium.ts'

// `host` drives the loopback host, `app` the real main and preload bundles under the Electron stand-in.
// What both must do alike is written once, in *.both.spec.ts.
export default defineConfig({
  testDir: 'tests/e2e',
  globalSetup: './tests/e2e/global-setup.ts',
  outputDir: 'test-results',
  fullyParallel: true,
  workers: 2,
  forbidOnly: true,
  reporter: [['list']],
  timeout: 30_000,
  projects: [
    { name: 'host', testIgnore: /\.(app|electron)\.spec\.ts$/ },
    { name: 'app', testMatch: /\.(app|both)\.spec\.ts$/ },
    { name: 'electron', testMatch: /\.electron\.spec\.ts$/ },
  ],
  use: {
    viewport: { width: 1280, height: 800 },
    launchOptions: chromiumLaunch,
  },
})
