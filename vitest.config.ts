import { fileURLToPath } from 'node:url'
import { defineConfig } from 'vitest/config'

const sourceFolder = fileURLToPath(new URL('./src', import.meta.url))
const emptyModule = fileURLToPath(new URL('./test/support/empty-module.ts', import.meta.url))
const alias = { '@': sourceFolder, 'server-only': emptyModule }

export default defineConfig({
  resolve: { alias },
  test: {
    projects: [
      {
        resolve: { alias },
        test: {
          name: 'unit',
          include: [
            'src/**/*.test.ts',
            'src/**/*.test.tsx',
            'test/reference/**/*.test.ts',
            'test/guards/**/*.test.ts',
            'test/bench/**/*.test.ts',
          ],
          testTimeout: 60_000,
        },
      },
      {
        resolve: { alias },
        test: {
          name: 'db',
          include: ['test/db/**/*.test.ts', 'test/jobs/**/*.test.ts'],
          globalSetup: ['test/support/database-teardown.ts'],
          testTimeout: 60_000,
          hookTimeout: 60_000,
        },
      },
      {
        resolve: { alias },
        test: {
          name: 'api',
          // Vite has a BASE_URL of its own, which would take the place of the site's address.
          env: { BASE_URL: process.env.BASE_URL ?? '' },
          include: ['test/api/**/*.test.ts'],
          testTimeout: 60_000,
          hookTimeout: 60_000,
        },
      },
    ],
  },
})
