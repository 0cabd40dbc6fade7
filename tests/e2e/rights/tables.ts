import { randomBytes } from 'node:crypto'
import { existsSync, mkdirSync, writeFileSync } from 'node:fs'
import { dirname } from 'node:path'
import { gzipSync } from 'node:zlib'
import { originals, tables, uploads } from '../../../server/db/schema'
import { newId } from '../../../server/db/schema/id'
import { originalPath } from '../../../server/domain/table/originals'
import type { RightsFile, RightsRow } from '../../support/rights'

const sha256 = 'ab'.repeat(32)

/** A table with its upload and its original, new for each request. */
const before: RightsRow['before'] = (fixture, { db, folder }) => {
  const { studyId, analystId } = fixture
  if (!studyId || !analystId) throw new Error('the fixture has no study')
  const path = originalPath(folder, sha256)
  if (!existsSync(path)) {
    mkdirSync(dirname(path), { recursive: true })
    writeFileSync(path, gzipSync('m/z'))
  }
  db.insert(originals).values({ sha256, bytes: 3, compressedBytes: 23 }).onConflictDoNothing().run()
  const upload = { studyId, fileName: 'a.csv', sha256, bytes: 3, createdBy: analystId }
  const read = db.insert(uploads).values({ ...upload, status: 'read' }).returning().get().id
  fixture.uploadId = db.insert(uploads).values({ ...upload, status: 'refused' }).returning().get().id
  fixture.tableId = db.insert(tables).values({ studyId, uploadId: read, originalSha256: sha256, fileName: 'a.csv', digest: newId(), layout: {} as never, measure: 'area', massKind: 'mz', features: 0, createdBy: analystId }).returning().get().id
}

const upload = '/api/studies/[studyId]/uploads'
const table = '/api/studies/[studyId]/tables'

const file: RightsFile = {
  rows: [
    { route: `POST ${upload}`, needs: 'editStudy', query: 'name=a.csv', ok: 202, body: () => new Uint8Array(randomBytes(64)) },
    { route: `GET ${upload}/[uploadId]`, needs: 'readStudy', before },
    { route: `DELETE ${upload}/[uploadId]`, needs: 'editStudy', before },
    // The refused file has no survey to answer to: 404 for those who may answer.
    { route: `PUT ${upload}/[uploadId]/answers`, needs: 'editStudy', before, ok: 404, body: () => ({ answers: {} }) },
    { route: `GET ${table}`, needs: 'readStudy' },
    { route: `PATCH ${table}/[tableId]`, needs: 'editStudy', before, body: () => ({ statedFloor: 5 }) },
    { route: `DELETE ${table}/[tableId]`, needs: 'editStudy', before },
    { route: `GET ${table}/[tableId]/refused`, needs: 'readStudy', before },
    { route: `GET ${table}/[tableId]/refused.csv`, needs: 'export', before },
    { route: `GET ${table}/[tableId]/original`, needs: 'export', before },
  ],
}
export default file
