import withNuxt from './.nuxt/eslint.config.mjs'

export default withNuxt({
  rules: {
    '@typescript-eslint/no-explicit-any': 'error',
    'vue/multi-word-component-names': 'off',
    'vue/html-self-closing': 'off',
  },
}, { ignores: ['drizzle/**', 'tests/reference/**/*.py', '.data/**'] })
