import { closeSync, openSync, readSync } from 'node:fs'
import type { Database } from '../../db/open'
import type { ReadColumn } from './readUpload'
import { keepColumn, PART_BYTES } from './tableColumns'

/** One buffer for all columns that ever come: the database copies each part as it is written. */
const part = Buffer.allocUnsafeSlow(PART_BYTES)

/** Takes the columns of one table from the file a worker has written into the database, part by part. */
export function keepReadColumns(db: Database, tableId: string, path: string, columns: readonly ReadColumn[]) {
  const file = openSync(path, 'r')
  try {
    for (const { name, offset, bytes } of columns) keepColumn(db, tableId, name, partsOf(file, offset, bytes))
  }
  finally {
    closeSync(file)
  }
}

function* partsOf(file: number, offset: number, bytes: number): Generator<Buffer> {
  for (let at = 0; at < bytes;) {
    const wanted = Math.min(PART_BYTES, bytes - at)
    let read = 0
    while (read < wanted) {
      const got = readSync(file, part, read, wanted - read, offset + at + read)
      if (got === 0) throw new Error('The file of columns is shorter than the worker said.')
      read += got
    }
    yield part.subarray(0, wanted)
    at += wanted
  }
}
