import { fileURLToPath } from 'node:url'
import { defineConfig } from 'vitest/config'

const root = fileURLToPath(new URL('.', import.meta.url))
const alias = {
  '@': root.replace(/\/$/, ''),
  // Next resolves this marker away on the server; outside Next it would throw.
  'server-only': `${root}tests/support/server-only.ts`,
}
const shared = { resolve: { alias }, oxc: { jsx: { runtime: 'automatic' } } } as const

export default defineConfig({
  ...shared,
  test: {
    projects: [
      {
        ...shared,
        test: {
          name: 'unit',
          environment: 'node',
          include: ['tests/**/*.test.ts'],
          exclude: ['tests/server/**', 'tests/e2e/**', 'tests/bench/**'],
          setupFiles: ['tests/support/no-unexpected-console.ts'],
        },
      },
      {
        ...shared,
        test: {
          name: 'dom',
          environment: 'jsdom',
          include: ['tests/**/*.test.tsx'],
          setupFiles: ['tests/support/no-unexpected-console.ts', 'tests/support/dom.ts'],
        },
      },
      {
        ...shared,
        test: {
          name: 'server',
          environment: 'node',
          include: ['tests/server/**/*.test.ts'],
          setupFiles: ['tests/support/no-unexpected-console.ts'],
        },
      },
      {
        ...shared,
        test: {
          name: 'e2e',
          environment: 'node',
          include: ['tests/e2e/**/*.test.ts'],
          testTimeout: 300_000,
          hookTimeout: 300_000,
          fileParallelism: false,
        },
      },
    ],
  },
})
