import { svelte } from '@sveltejs/vite-plugin-svelte'
import { playwright } from '@vitest/browser-playwright'
import { defineConfig } from 'vitest/config'
import { chromiumLaunch } from './tests/chromium.ts'

// Timing is for the benchmarks: a busy machine must not fail a test.
const patient = { testTimeout: 120_000, hookTimeout: 120_000 }

export default defineConfig({
  test: {
    coverage: {
      provider: 'v8',
      include: ['src/**/*.{ts,svelte}'],
      reporter: ['text-summary', 'text', 'json-summary'],
    },
    projects: [
      {
        test: {
          name: 'node',
          ...patient,
          environment: 'node',
          include: ['tests/**/*.test.ts'],
          exclude: ['tests/**/*.browser.test.ts'],
        },
      },
      {
        plugins: [svelte({ configFile: false })],
        // Found while tests run, these would be bundled anew, and with a second copy of Svelte.
        optimizeDeps: {
          include: [
            'bits-ui',
            'chart.js',
            'devalue',
            'fast-check',
            'svelte',
            'vitest-browser-svelte',
            'zod',
          ],
        },
        test: {
          name: 'browser',
          ...patient,
          include: ['tests/ui/**/*.browser.test.ts'],
          globalSetup: ['tests/ui/node-results.ts'],
          browser: {
            enabled: true,
            headless: true,
            screenshotFailures: false,
            provider: playwright({ launchOptions: chromiumLaunch }),
            instances: [{ browser: 'chromium' }],
          },
        },
      },
    ],
  },
})
