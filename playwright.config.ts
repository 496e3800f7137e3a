import { defineConfig } from '@playwright/test'
import { chromium } from './test/support/chromium'

const baseURL = process.env.BASE_URL
if (!baseURL) throw new Error('BASE_URL names no server to test: run the browser tests through make test.')

export default defineConfig({
  testDir: 'test/e2e',
  forbidOnly: true,
  retries: 0,
  workers: 2,
  timeout: 60_000,
  use: {
    baseURL,
    trace: 'retain-on-failure',
    launchOptions: chromium,
  },
  projects: [
    { name: 'desk', testIgnore: '**/*.phone.spec.ts', use: { viewport: { width: 1440, height: 900 } } },
    {
      name: 'phone',
      testMatch: '**/*.phone.spec.ts',
      use: { viewport: { width: 390, height: 844 }, hasTouch: true, isMobile: true },
    },
  ],
})
