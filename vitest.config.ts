import { fileURLToPath } from 'node:url'
import { defineVitestProject } from '@nuxt/test-utils/config'
import { defineConfig } from 'vitest/config'

const root = (path: string) => fileURLToPath(new URL(path, import.meta.url))

/** A project that runs in plain Node: science, domain functions, and the built server over HTTP. */
const plain = (name: string, options: Record<string, unknown> = {}) => ({
  resolve: { alias: { '#shared': root('./shared'), '#server': root('./server'), '~': root('./app') } },
  test: { name, include: [`tests/${name}/**/*.test.ts`], environment: 'node', testTimeout: 60_000, ...options },
})

export default defineConfig({
  test: {
    projects: [
      plain('unit'),
      plain('reference'),
      plain('server'),
      await defineVitestProject({ test: { name: 'nuxt', include: ['tests/nuxt/**/*.test.ts'], environment: 'nuxt', testTimeout: 60_000 } }),
      plain('browser', { include: ['tests/e2e/**/*.test.ts'], fileParallelism: false, testTimeout: 240_000, hookTimeout: 240_000 }),
    ],
  },
})
