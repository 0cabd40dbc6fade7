import { afterEach, beforeEach, describe, expect, it } from 'vitest'
import { tableColumns } from '../../../server/db/schema'
import { keepColumns, readColumn, readWideRows } from '../../../server/domain/table/tableColumns'
import { addTestPerson, addTestStudy, openTestLaboratory, type TestLaboratory } from '../../support/laboratory'
import { addTestTable } from '../../support/testTable'

let laboratory: TestLaboratory
let tableId: string
beforeEach(async () => {
  laboratory = await openTestLaboratory()
  const person = addTestPerson(laboratory, 'analyst')
  const none = { mz: [], minutes: [], intensity: [] }
  tableId = addTestTable(laboratory, addTestStudy(laboratory, person).id, person.id, none, null).id
})
afterEach(() => laboratory.close())

describe('columns in parts', () => {
  it.each([0, 1, 131_072, 131_073, 400_001])('come back as they were: %i values', (length) => {
    const { db } = laboratory
    const mz = Float64Array.from({ length }, (_, index) => index / 3)
    const wideRow = Int32Array.from({ length }, (_, index) => index * 2)
    keepColumns(db, tableId, { mz, retentionMinutes: mz, intensity: mz.map(value => -value), width: mz, wideRow })
    expect(readColumn(db, tableId, 'mz')).toEqual(mz)
    expect(readColumn(db, tableId, 'intensity').at(-1)).toBe(length === 0 ? undefined : -(length - 1) / 3)
    expect(readColumn(db, tableId, 'width')).toEqual(mz)
    expect(readWideRows(db, tableId)).toEqual(wideRow)
    expect(db.select({ part: tableColumns.part }).from(tableColumns).all()).toHaveLength(4 * Math.ceil(length / 131_072) + Math.ceil(length / 262_144))
  })
})
