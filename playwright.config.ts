import { defineConfig } from '@playwright/test'
import { findChromium } from './server/cli/lib/chromium.mjs'

export default defineConfig({
  testDir: 'tests/e2e',
  outputDir: 'test-results/e2e',
  forbidOnly: true,
  fullyParallel: false,
  // Two at a time, a file each: no test may lean on what another makes or leaves.
  workers: 2,
  timeout: 120_000,
  expect: { timeout: 20_000 },
  use: {
    baseURL: process.env['E2E_URL'] ?? 'http://127.0.0.1:4310',
    actionTimeout: 30_000,
    // Nothing moves by itself: a colour measured half-way between two lights is neither.
    contextOptions: { reducedMotion: 'reduce' },
    locale: 'en-US',
    timezoneId: 'America/Los_Angeles',
    screenshot: 'only-on-failure',
    // Kept at every step a trace costs a fifth of the run; ask for one with --trace on.
    trace: 'off',
    launchOptions: {
      executablePath: findChromium() ?? '',
      // Debian's Chromium on a machine without a way out: nothing but the page under test
      // No page lives long enough to earn back what its code is optimised with: without, axe takes half its time.
      args: ['--js-flags=--no-maglev --no-turbofan', '--disable-quic', '--disable-background-networking', '--disable-component-update', '--disable-sync', '--no-first-run'],
    },
  },
  // A story is told where it is lived most: *.desk.spec.ts, *.phone.spec.ts. What differs between the two, and the walk over every screen, is told on both.
  projects: [
    { name: 'desk', testIgnore: '**/*.phone.spec.ts', use: { viewport: { width: 1440, height: 900 } } },
    { name: 'phone', testIgnore: '**/*.desk.spec.ts', use: { viewport: { width: 390, height: 844 }, hasTouch: true, isMobile: true, deviceScaleFactor: 2 } },
  ],
})
