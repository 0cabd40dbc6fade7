import { fileURLToPath } from 'node:url'
import { defineVitestProject } from '@nuxt/test-utils/config'
import { defineConfig } from 'vitest/config'

const root = (path: string) => fileURLToPath(new URL(path, import.meta.url))

/** On a busy machine of others' a test may meet a moment that it never meets here: tried again, and marked so in the record. */
const retry = process.env.CI ? 2 : 0

/** A project that runs in plain Node: science, domain functions, and the built server over HTTP. */
const plain = (name: string, options: Record<string, unknown> = {}) => ({
  resolve: { alias: { '#shared': root('./shared'), '#server': root('./server'), '~': root('./app') } },
  test: { name, include: [`tests/${name}/**/*.test.ts`], environment: 'node', retry, testTimeout: 60_000, hookTimeout: 60_000, ...options },
})

export default defineConfig({
  test: {
    projects: [
      plain('unit'),
      plain('reference'),
      plain('server'),
      await defineVitestProject({ test: { name: 'nuxt', include: ['tests/nuxt/**/*.test.ts'], environment: 'nuxt', retry, testTimeout: 60_000, hookTimeout: 60_000 } }),
      plain('browser', { include: ['tests/e2e/**/*.test.ts'], fileParallelism: false, testTimeout: 240_000, hookTimeout: 240_000 }),
    ],
  },
})
