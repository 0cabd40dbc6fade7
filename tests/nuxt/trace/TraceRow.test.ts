import { mountSuspended } from '@nuxt/test-utils/runtime'
import { expect, it } from 'vitest'
import type { TraceLine } from '#shared/types/trace'
import DropZone from '~/components/base/DropZone.vue'
import TraceList from '~/components/trace/TraceList.vue'
import TraceDropZone from '~/components/trace/TraceDropZone.vue'

const line = (id: string, rest: Partial<TraceLine> = {}): TraceLine => ({
  id, fileName: `${id}.mzML`, sampleId: id, sampleName: `Sample ${id}`, bytes: 3 * 2 ** 20, keptBytes: 2 ** 20, polarity: 'negative', profile: false, scans: 1200, centroids: 34_000, intensityLimit: 0,
  lowestMz: 100.1, highestMz: 900.2, remark: null, createdAt: '2026-03-02T10:00:00.000Z', createdByName: 'An analyst', versions: 0, replacedAt: null, ...rest,
})
const samples = ['one', 'two', 'three'].map(id => ({ id, name: `Sample ${id}` }))

it('lists traces with what is kept of them, and offers a sample only to one', async () => {
  const list = await mountSuspended(TraceList, { props: { studyId: 's', samples, mayEdit: true, traces: [line('one', { profile: true, remark: 'The file holds profile data.', intensityLimit: 500 }), line('two', { sampleId: null, sampleName: null }), line('three', { replacedAt: '2026-03-03T10:00:00.000Z', versions: 1 })] } })
  expect(list.findAll('tbody tr')).toHaveLength(2)
  expect(list.text()).toContain('The file holds profile data.')
  expect(list.text()).toContain('Points below 500 counts were not kept.')
  expect(list.text()).toContain('Kept in all: 3.0 MB.')
  expect(list.get('select[aria-label="Sample of two.mzML"]').findAll('option').map(option => option.text())).toEqual(['choose a sample', 'Sample two', 'Sample three'])
  await list.get('input[type=checkbox]').setValue(true)
  expect(list.text()).toContain('out of use; one version of a comparison looked into it')
  expect(list.findAll('button[aria-label="Replace three.mzML"]')).toHaveLength(0)
})

it('leaves the acts out for those who may only look', async () => {
  const list = await mountSuspended(TraceList, { props: { studyId: 's', samples, mayEdit: false, traces: [line('one')] } })
  expect([list.findAll('select'), list.findAll('button')]).toEqual([[], []])
  expect(list.text()).toContain('Sample one')
})

it('hands on the files that are dropped, and the limit that is typed', async () => {
  const zone = await mountSuspended(TraceDropZone, { props: { polarity: 'negative', limit: 0 } })
  const dropped = [new File(['x'], 'a.mzML')]
  await zone.get('section').trigger('drop', { dataTransfer: { files: dropped } })
  expect(zone.emitted('files')?.at(-1)).toEqual([dropped])
  await zone.get('input[inputmode=decimal]').setValue('250,5')
  expect(zone.emitted('update:limit')?.at(-1)).toEqual([250.5])
  expect(zone.getComponent(DropZone).text()).toContain('Its MS1 scans in negative mode are read')
})
