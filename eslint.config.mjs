import withNuxt from './.nuxt/eslint.config.mjs'

export default withNuxt({
  rules: {
    '@typescript-eslint/no-explicit-any': 'error',
    'vue/multi-word-component-names': 'off',
    'vue/html-self-closing': 'off',
    'vue/require-default-prop': 'off',
    'vue/no-multiple-template-root': 'off',
  },
}, { ignores: ['drizzle/**', 'tests/reference/**/*.py', '.data/**'] })
