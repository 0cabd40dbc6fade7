import { mkdtempSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { afterEach, beforeEach, expect, it } from 'vitest'
import { CentroidSpill } from '../../../server/domain/trace/files/spillCentroids'

let folder: string
beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), 'steelyard-spill-'))
})
afterEach(() => rmSync(folder, { recursive: true }))

it('a file that fills one slice after the other gets no more room than any, and loses no point', () => {
  const spill = new CentroidSpill(folder)
  const slices = 500
  const each = 8193
  let mostRoom = 0
  for (let slice = 0; slice < slices; slice++) {
    for (let i = 0; i < each; i++) spill.add(slice * 10 + 5, i + 1, i)
    mostRoom = Math.max(mostRoom, spill.room)
  }
  expect(mostRoom).toBeLessThanOrEqual(3_000_000)
  expect(spill.points).toBe(slices * each)
  expect(spill.all()).toHaveLength(slices)
  for (const slice of [0, 1, 250, slices - 1]) {
    const { mz, intensity, scan } = spill.take(slice)
    expect(mz).toHaveLength(each)
    expect(mz.every(value => value === slice * 10 + 5)).toBe(true)
    expect(intensity.every((value, i) => value === i + 1)).toBe(true)
    expect(scan.at(-1)).toBe(each - 1)
  }
})
