import { mockNuxtImport } from '@nuxt/test-utils/runtime'
import { beforeEach, describe, expect, it, vi } from 'vitest'
import { alignmentRows } from './cases/alignment'
import { baseRows } from './cases/base'
import { chartRows } from './cases/chart'
import { comparisonRows } from './cases/comparison'
import type { ComponentRows } from './cases/componentCase'
import { flagRows } from './cases/flag'
import { methodRows } from './cases/method'
import { seeCase } from './cases/mountCase'
import { personRows } from './cases/person'
import { practiceRows } from './cases/practice'
import { sampleRows } from './cases/sample'
import { shareRows } from './cases/share'
import { studyRows } from './cases/study'
import { tableRows } from './cases/table'
import { traceRows } from './cases/trace'

const { went } = vi.hoisted(() => ({ went: [] as unknown[] }))
mockNuxtImport('navigateTo', () => async (to: unknown) => void went.push(to))
// There is no canvas here; what is drawn is held by the tests of app/charts.
vi.mock('vue-echarts', () => ({ default: { name: 'VChart', props: ['option', 'updateOptions', 'autoresize'], emits: ['click', 'rendered'], template: '<div class="drawing" />' } }))
beforeEach(() => void went.splice(0))

const rows: ComponentRows = {
  ...alignmentRows, ...baseRows, ...chartRows, ...comparisonRows, ...flagRows, ...methodRows, ...personRows, ...practiceRows, ...sampleRows, ...shareRows, ...studyRows, ...tableRows, ...traceRows,
}

const pathOf = (file: string) => file.replace('../../app/components/', '').replace('.vue', '')
const components = Object.keys(import.meta.glob('../../app/components/**/*.vue')).map(pathOf)
const ownTests = import.meta.glob<string>('./**/*.test.ts', { query: '?raw', import: 'default' })
const browserTests = Object.keys(import.meta.glob('../e2e/**/*.test.ts'))

it('has a row for every component, and none for what is gone', () => {
  expect(Object.keys(rows).sort()).toEqual(components.sort())
})

describe.each(Object.entries(rows))('%s', (path, row) => {
  if (Array.isArray(row)) {
    it('has cases of itself', () => {
      expect(row.map(({ component }) => '__name' in component && component.__name)).toEqual(row.map(() => path.split('/').at(-1)?.replace('.client', '')))
      expect(row.length).toBeGreaterThan(0)
    })
    it.each(row)('$does', one => seeCase(one, went))
  }
  else if ('test' in row) {
    it(`is tested by ${row.test}`, async () => {
      const text = await ownTests[row.test.replace('tests/nuxt/', './')]?.()
      expect(text).toContain(`/components/${path}.vue'`)
    })
  }
  else {
    it(`is driven in a browser: ${row.because}`, () => {
      expect(browserTests).toContain(row.drivenBy.replace('tests/', '../'))
      expect(row.because.length).toBeGreaterThan(30)
    })
  }
})
