import { readdirSync } from 'node:fs'
import { fileURLToPath } from 'node:url'
import { readMigrationFiles } from 'drizzle-orm/migrator'
import { bundleWorker } from './scripts/bundleWorker'

const root = (path: string) => fileURLToPath(new URL(path, import.meta.url))

/**
 * Every file in server/workers is bundled to text, so that built output needs no path to it (see DEVELOPERS.md).
 * Base64, because the build replaces words such as `typeof window` inside plain text too, and breaks it.
 */
function workerSources() {
  const names = readdirSync(root('./server/workers')).filter(name => name.endsWith('.ts'))
  return names.map(name => [name.replace('.ts', ''), Buffer.from(bundleWorker(root(`./server/workers/${name}`))).toString('base64')])
}

export default defineNuxtConfig({
  modules: ['@nuxt/eslint', '@nuxtjs/tailwindcss', '@pinia/nuxt', 'nuxt-auth-utils', 'nuxt-security'],
  components: [{ path: '~/components', pathPrefix: false }],
  app: {
    head: {
      htmlAttrs: { lang: 'en' },
      titleTemplate: '%s · Steelyard',
      link: [{ rel: 'icon', type: 'image/svg+xml', href: '/icon.svg' }],
      // zod would try eval once to see whether it may, and the content policy reports that; this tells it before.
      script: [{ innerHTML: 'globalThis.__zod_globalConfig = { jitless: true }' }],
    },
  },
  css: ['~/assets/fonts.css'],
  compatibilityDate: '2026-11-01',
  telemetry: false,
  typescript: { strict: true, tsConfig: { compilerOptions: { noUncheckedIndexedAccess: false } } },

  runtimeConfig: {
    session: { name: 'steelyard-session', password: '', maxAge: 43_200, cookie: { secure: true, sameSite: 'lax' } },
  },
  auth: { loadStrategy: 'none', hash: { scrypt: { cost: 2 ** 17, blockSize: 8, parallelization: 1, maxMemory: 192 * 2 ** 20 } } },
  tailwindcss: { viewer: false, cssPath: '~/assets/main.css' },

  vite: { resolve: { alias: { '@stdlib/assert-has-generator-support': root('./app/policy/hasGeneratorSupport.cjs') } } },

  // Headers and nonce only: the module's other defaults refuse honest input (an "m/z < 200" looks like an attack to it).
  security: {
    rateLimiter: false,
    xssValidator: false,
    corsHandler: false,
    removeLoggers: false,
    requestSizeLimiter: { maxRequestSizeInBytes: 2_000_000, maxUploadFileRequestInBytes: 2_000_000, throwError: true },
    headers: {
      crossOriginEmbedderPolicy: 'require-corp',
      strictTransportSecurity: false,
      xFrameOptions: 'DENY',
      contentSecurityPolicy: {
        'default-src': ['\'none\''],
        'base-uri': ['\'none\''],
        'form-action': ['\'self\''],
        'frame-ancestors': ['\'none\''],
        'object-src': ['\'none\''],
        'connect-src': ['\'self\''],
        'font-src': ['\'self\''],
        'img-src': ['\'self\'', 'data:', 'blob:'],
        'manifest-src': ['\'self\''],
        'worker-src': ['\'self\''],
        'script-src': ['\'self\'', '\'strict-dynamic\'', '\'nonce-{{nonce}}\''],
        'script-src-attr': ['\'none\''],
        'style-src': ['\'self\'', '\'nonce-{{nonce}}\''],
        'style-src-attr': ['\'unsafe-inline\''],
        'upgrade-insecure-requests': false,
      },
    },
  },
  routeRules: {
    '/**': { headers: { 'cache-control': 'no-store' } },
    // A worker's script carries a policy of its own: it must ask for isolation as the page does, and may load nothing.
    '/_nuxt/**': { headers: { 'cache-control': 'public, max-age=31536000, immutable', 'cross-origin-embedder-policy': 'require-corp', 'content-security-policy': 'default-src \'none\'' } },
    // Counted and refused with a sentence by receiveFile (tableLimit, traceLimit).
    '/api/studies/*/uploads': { security: { requestSizeLimiter: { maxRequestSizeInBytes: 2 ** 40 } } },
    '/api/studies/*/traces/uploads': { security: { requestSizeLimiter: { maxRequestSizeInBytes: 2 ** 40 } } },
  },
  nitro: {
    compressPublicAssets: true,
    virtual: {
      '#workers': () => `export default Object.fromEntries(${JSON.stringify(workerSources())}.map(([name, text]) => [name, Buffer.from(text, 'base64').toString('utf8')]))`,
      '#migrations': () => `export default ${JSON.stringify(readMigrationFiles({ migrationsFolder: root('./drizzle') }))}`,
    },
  },
})
