import { asc, eq } from 'drizzle-orm'
import type { Side } from '../../../shared/schemas/sample'
import type { ComparedSample } from '../../../shared/science/verdict/settings'
import type { Database } from '../../db/open'
import { alignmentTables, samples, tables } from '../../db/schema'

/** Under this share of empty cells a column of a wide file seems gap-filled. */
const GAP_FILLED_SHARE = 0.01

/** Sides by hand: a sample's id and its side. */
export type SidesByHand = Record<string, Side | null>

/**
 * The samples of an alignment as the sample sheet has them now, one a table in the alignment's order.
 * Floors are the stated ones; where none is stated the floor is NaN until the job estimates it.
 */
export function snapshotSamples(db: Database, alignmentId: string, byHand: SidesByHand = {}): ComparedSample[] {
  const rows = db.select({
    sample: samples,
    tableId: alignmentTables.tableId,
    sampleName: alignmentTables.sampleName,
    columnName: tables.columnName,
    emptyShare: tables.emptyShare,
    statedFloor: tables.statedFloor,
    measure: tables.measure,
  }).from(alignmentTables)
    .innerJoin(tables, eq(tables.id, alignmentTables.tableId))
    .leftJoin(samples, eq(samples.id, alignmentTables.sampleId))
    .where(eq(alignmentTables.alignmentId, alignmentId))
    .orderBy(asc(alignmentTables.position)).all()

  return rows.map(({ sample, ...table }): ComparedSample => ({
    ...(sample ? fromSheet(sample) : withoutSheet(table.tableId, table.sampleName)),
    ...(sample ? sideOf(sample, byHand) : {}),
    floor: table.statedFloor ?? Number.NaN,
    floorSource: table.statedFloor === null ? 'estimated' : 'stated',
    gapFilled: table.columnName !== null && table.emptyShare !== null && table.emptyShare < GAP_FILLED_SHARE,
    measure: table.measure,
  }))
}

type SheetFields = Omit<ComparedSample, 'floor' | 'floorSource' | 'gapFilled' | 'measure'>

function fromSheet(sample: typeof samples.$inferSelect): SheetFields {
  const { id, name, kind, side, preparation, amount, amountUnit, volumeMl, dilution, injectionUl, runOrder, batch } = sample
  return { id, name, kind, side, preparation, amount, amountUnit: amount === null ? null : amountUnit, volumeMl, dilution, injectionUl, runOrder, batch: batch || null }
}

/** A table whose sample was taken off the sheet: shown, never compared. */
function withoutSheet(tableId: string, name: string): SheetFields {
  return { id: tableId, name, kind: 'sample', side: null, preparation: '', amount: null, amountUnit: null, volumeMl: null, dilution: null, injectionUl: null, runOrder: null, batch: null }
}

/** Sides chosen by hand, put over the samples of a version. */
export function withSides(kept: readonly ComparedSample[], byHand: SidesByHand): ComparedSample[] {
  return kept.map(sample => ({ ...sample, ...sideOf(sample, byHand) }))
}

function sideOf({ id, side }: { id: string, side: Side | null }, byHand: SidesByHand): Pick<ComparedSample, 'side' | 'sideByHand'> {
  const chosen = byHand[id]
  return chosen === undefined || chosen === side ? { side } : { side: chosen, sideByHand: true }
}
