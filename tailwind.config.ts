import type { Config } from 'tailwindcss'
import { dark, fonts, light, typeScale, type Palette } from './shared/tokens'

const names = Object.keys(light) as (keyof Palette)[]
const kebab = (name: string) => name.replace(/[A-Z]/g, letter => `-${letter.toLowerCase()}`)
const channels = (hex: string) => [1, 3, 5].map(at => Number.parseInt(hex.slice(at, at + 2), 16)).join(' ')
const variables = (palette: Palette) => Object.fromEntries(names.map(name => [`--${kebab(name)}`, channels(palette[name])]))

export default {
  content: ['./app/**/*.{vue,ts}', '!./app/charts/**'],
  // The scheme follows the system, and a person may choose (data-scheme on <html>).
  darkMode: ['variant', ['@media (prefers-color-scheme: dark) { &:not([data-scheme=light] *) }', '&:is([data-scheme=dark] *)']],
  theme: {
    colors: {
      transparent: 'transparent',
      current: 'currentColor',
      inherit: 'inherit',
      ...Object.fromEntries(names.map(name => [kebab(name), `rgb(var(--${kebab(name)}) / <alpha-value>)`])),
    },
    fontFamily: { text: fonts.text, numbers: fonts.numbers },
    fontSize: Object.fromEntries(Object.entries(typeScale).map(([name, px]) => [name, [`${px / 16}rem`, '1.45']])),
    borderRadius: { none: '0', DEFAULT: '3px', full: '9999px' },
    boxShadow: {},
    extend: { maxWidth: { page: '90rem', text: '42rem' } },
  },
  plugins: [
    ({ addBase }) => addBase({
      ':root': { ...variables(light), 'color-scheme': 'light' },
      ':root[data-scheme=dark]': { ...variables(dark), 'color-scheme': 'dark' },
      '@media (prefers-color-scheme: dark)': { ':root:not([data-scheme=light])': { ...variables(dark), 'color-scheme': 'dark' } },
      '@media print': { ':root, :root[data-scheme], :root:not([data-scheme=light])': { ...variables({ ...light, paper: light.panel }), 'color-scheme': 'light' } },
    }),
  ],
} satisfies Config
