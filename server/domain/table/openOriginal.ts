import { createReadStream, existsSync } from 'node:fs'
import { createGunzip } from 'node:zlib'
import { and, eq } from 'drizzle-orm'
import { pipeline, type Readable } from 'node:stream'
import type { Database } from '../../db/open'
import { originals, tables } from '../../db/schema'
import { DomainError, notFound } from '../DomainError'
import { originalPath } from './originals'

/** The file a table was read from, byte for byte as it came. */
export function openOriginal(db: Database, folder: string, studyId: string, tableId: string): { fileName: string, bytes: number, stream: Readable } {
  const table = db.select({ fileName: tables.fileName, sha256: originals.sha256, bytes: originals.bytes }).from(tables).innerJoin(originals, eq(originals.sha256, tables.originalSha256))
    .where(and(eq(tables.id, tableId), eq(tables.studyId, studyId))).get()
  if (!table) throw notFound()
  const path = originalPath(folder, table.sha256)
  if (!existsSync(path)) throw new DomainError('notFound', 'The original is not in the data folder any more. Ask the lab lead about a backup.')
  const stream = createGunzip()
  // Whichever ends early takes the other along; its receiver hears of an error from the stream itself.
  pipeline(createReadStream(path), stream, () => {})
  return { fileName: table.fileName, bytes: table.bytes, stream }
}
