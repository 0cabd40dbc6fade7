/**
 * The design tokens as values: tailwind.config.ts turns them into classes, charts read them directly.
 * Contrast on paper is at least 4.5:1 for text and 3:1 for marks, in both schemes.
 */
export interface Palette {
  paper: string
  panel: string
  ink: string
  muted: string
  hairline: string
  sideA: string
  sideB: string
  level: string
  unsettled: string
  aside: string
  focus: string
  warn: string
  danger: string
}

export const light: Palette = {
  paper: '#F7F5F0',
  panel: '#FFFFFF',
  ink: '#1B2124',
  muted: '#5A646A',
  hairline: '#D6D5D1',
  sideA: '#0B6671',
  sideB: '#A8471C',
  level: '#4F6B3A',
  unsettled: '#7A5C9E',
  aside: '#7C858A',
  focus: '#2457C5',
  warn: '#7A5200',
  danger: '#A3262E',
}

export const dark: Palette = {
  paper: '#15191B',
  panel: '#1D2326',
  ink: '#E9ECEA',
  muted: '#A3ADB1',
  hairline: '#353A3C',
  sideA: '#58BCC6',
  sideB: '#EE9A6C',
  level: '#A4C08A',
  unsettled: '#BCA3DC',
  aside: '#8B959A',
  focus: '#8FB2FF',
  warn: '#E9BE6B',
  danger: '#F08A8F',
}

export const fonts = {
  text: '"Atkinson Hyperlegible Next Variable", sans-serif',
  numbers: '"Atkinson Hyperlegible Mono Variable", monospace',
}

/** Sizes in CSS pixels. */
export const typeScale = { small: 13, base: 15, large: 18, title: 23, display: 30 }
