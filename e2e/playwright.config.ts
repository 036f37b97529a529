import { existsSync } from 'node:fs'
import { defineConfig } from 'playwright/test'

const chromium = process.env.CHROMIUM_PATH ?? '/usr/bin/chromium'
if (!existsSync(chromium))
  throw new Error(`There is no Chromium at ${chromium}: install it or set CHROMIUM_PATH.`)

export default defineConfig({
  testDir: '.',
  testMatch: '*.spec.ts',
  outputDir: '../test-results',
  fullyParallel: false,
  workers: 1,
  retries: 0,
  timeout: 120_000,
  expect: { timeout: 15_000 },
  forbidOnly: process.env.CI !== undefined,
  use: {
    trace: 'retain-on-failure',
    locale: 'en-US',
    timezoneId: 'America/New_York',
    launchOptions: {
      executablePath: chromium,
      args: [
        '--no-sandbox',
        '--disable-gpu',
        '--disable-quic',
        '--no-first-run',
        '--disable-background-networking',
        '--disable-component-update',
        '--disable-sync',
      ],
    },
  },
})
