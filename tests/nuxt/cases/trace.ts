import { expect } from 'vitest'
import TraceRow from '~/components/trace/TraceRow.vue'
import type { TraceLine } from '#shared/types/trace'
import { holds, type ComponentRows } from './componentCase'
import { refusal } from './mountCase'

const trace: TraceLine = {
  id: 'r1', fileName: 'm1.mzML', sampleId: 'x1', sampleName: 'M1', bytes: 4e7, keptBytes: 9e6, polarity: 'negative', profile: false, scans: 1800, centroids: 1_200_000, intensityLimit: 500,
  lowestMz: 70.01, highestMz: 1049.9, remark: 'Its times were in seconds.', createdAt: '2026-02-03T11:30:00.000Z', createdByName: 'Eve Lark', versions: 0, replacedAt: null,
}
const inStudy = { studyId: 's1', samples: [{ id: 'x1', name: 'M1' }], taken: new Set(['x1']) }

export const traceRows: ComponentRows = {
  'trace/TraceDropZone': { test: 'tests/nuxt/trace/TraceRow.test.ts' },
  'trace/TraceList': { test: 'tests/nuxt/trace/TraceRow.test.ts' },
  'trace/TraceRow': [
    holds(TraceRow, 'says what is kept, and removes it after asking', { props: { ...inStudy, trace, mayEdit: true }, answers: { 'DELETE /api/studies/s1/traces/r1': {} } }, async ({ text, press, emitted, has, until }) => {
      expect(text()).toContain('Points below 500 counts were not kept.')
      expect(text()).toContain('70.0100 – 1049.9000')
      expect(has('Replace m1.mzML')).toBe(true)
      await press(/^Remove\s?m1.mzML$/)
      await press('Remove it')
      await until(() => expect(emitted('changed')).toHaveLength(1))
    }),
    holds(TraceRow, 'says why it stays', { props: { ...inStudy, trace: { ...trace, versions: 2 }, mayEdit: true }, answers: { 'DELETE /api/studies/s1/traces/r1': refusal('This study is archived.') } }, async ({ text, press, find, until }) => {
      await press(/^Remove\s?m1.mzML$/)
      expect(text()).toContain('2 versions of comparisons')
      await press('Remove it')
      await until(() => expect(find('[role=alert]').text()).toBe('This study is archived.'))
    }),
    holds(TraceRow, 'is only read once it is out of use', { props: { ...inStudy, trace: { ...trace, versions: 1, replacedAt: '2026-02-04T09:30:00.000Z' }, mayEdit: true } }, ({ text }) => {
      expect(text()).toContain('out of use; one version of a comparison looked into it')
      expect(document.querySelector('button')).toBeNull()
    }),
  ],
}
