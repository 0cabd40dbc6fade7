import { expect, it } from 'vitest'
import { escapeMarkup } from '../../../app/charts/escapeMarkup'

it('escapes what a hint says', () => {
  expect(escapeMarkup('<img onerror="x">\'&')).toBe('&lt;img onerror=&quot;x&quot;&gt;&#39;&amp;')
})
