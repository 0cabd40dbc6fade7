export default defineNuxtConfig({
  modules: ['@nuxt/eslint', '@nuxtjs/tailwindcss', '@pinia/nuxt', 'nuxt-auth-utils', 'nuxt-security'],
  compatibilityDate: '2026-11-01',
  telemetry: false,
  typescript: { strict: true },
})
