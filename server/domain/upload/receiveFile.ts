import { createHash } from 'node:crypto'
import { rmSync } from 'node:fs'
import { open, statfs } from 'node:fs/promises'
import { join } from 'node:path'
import { MAX_TABLE_BYTES } from '../../../shared/schemas/table'
import { MAX_TRACE_BYTES } from '../../../shared/schemas/trace'
import { newId } from '../../db/schema/id'
import { DomainError } from '../DomainError'

/** Bytes of disk that stay free, whatever comes in. */
const RESERVED_BYTES = 256 * 2 ** 20

/** A file that came in whole, in `incoming/`. */
export interface ReceivedFile { path: string, bytes: number, sha256: string }

/** What one kind of file may be. */
export interface UploadLimit {
  bytes: number
  /** Times its size that it needs on the disk while it is read: as it comes, and what is made of it. */
  room: number
  tooLarge: string
}

/** The file as it comes, its compressed copy and its columns. */
export const tableLimit: UploadLimit = { bytes: MAX_TABLE_BYTES, room: 3, tooLarge: `A feature table may have at most ${MAX_TABLE_BYTES / 2 ** 20} MB. Split the file, or leave out columns that are not needed.` }
/** The file as it comes, its points while they are sorted, and as they are kept. */
export const traceLimit: UploadLimit = { bytes: MAX_TRACE_BYTES, room: 5, tooLarge: `An mzML file may have at most ${MAX_TRACE_BYTES / 2 ** 20} MB. Export it centroided, with zlib compression, or leave out MS/MS scans.` }

/** Refuses what can't be kept before it comes: a file that is too large, or a disk that is too full. `bytes` as announced, or null. */
export async function checkRoom(folder: string, bytes: number | null, limit: UploadLimit = tableLimit) {
  if (bytes !== null && bytes > limit.bytes) throw new DomainError('tooLarge', limit.tooLarge)
  const { bavail, bsize } = await statfs(folder)
  if (bavail * bsize < RESERVED_BYTES + limit.room * (bytes ?? limit.bytes)) throw diskFull()
}

const diskFull = () => new DomainError('full', 'The server\'s disk is nearly full, so the file was not taken. Ask the lab lead to make room.')

/** Writes a file to `incoming/` as it arrives, counting and hashing. Whatever goes wrong, nothing of it stays. */
export async function receiveFile(folder: string, chunks: AsyncIterable<Uint8Array>, limit: UploadLimit = tableLimit): Promise<ReceivedFile> {
  const path = join(folder, 'incoming', newId())
  const hash = createHash('sha256')
  let bytes = 0
  const file = await open(path, 'wx', 0o600)
  try {
    for await (const chunk of chunks) {
      bytes += chunk.byteLength
      if (bytes > limit.bytes) throw new DomainError('tooLarge', limit.tooLarge)
      hash.update(chunk)
      await file.write(chunk)
    }
    await file.sync()
    return { path, bytes, sha256: hash.digest('hex') }
  }
  catch (error) {
    rmSync(path, { force: true })
    // Others' files may have taken the room meanwhile.
    throw error instanceof Error && 'code' in error && (error.code === 'ENOSPC' || error.code === 'EDQUOT') ? diskFull() : error
  }
  finally {
    await file.close()
  }
}
