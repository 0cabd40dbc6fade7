import { readFileSync } from 'node:fs'
import { basename } from 'node:path'
import { fileURLToPath } from 'node:url'
import { acceptUpload } from '../../server/domain/table/acceptUpload'
import { receiveFile } from '../../server/domain/upload/receiveFile'
import type { Person } from '../../server/domain/person/person'
import type { UploadAnswer } from '../../shared/types/table'
import type { TestLaboratory } from './laboratory'

/** A file under tests/reference/data. */
export const referenceFile = (path: string) => readFileSync(fileURLToPath(new URL(`../reference/data/${path}`, import.meta.url)))

/** Uploads content through the domain, as a person would, and waits until it is read. */
export async function uploadContent(laboratory: TestLaboratory, studyId: string, person: Person, name: string, content: string | Uint8Array, replaces?: string): Promise<UploadAnswer> {
  const bytes = typeof content === 'string' ? new TextEncoder().encode(content) : content
  const file = await receiveFile(laboratory.folder, (async function* () {
    for (let at = 0; at < bytes.length; at += 4096) yield bytes.subarray(at, at + 4096)
  })())
  const answer = acceptUpload(laboratory, studyId, file, { name, replaces }, person)
  await laboratory.jobs.idle()
  return answer
}

export const uploadReference = (laboratory: TestLaboratory, studyId: string, person: Person, path: string) => uploadContent(laboratory, studyId, person, basename(path), referenceFile(path))
