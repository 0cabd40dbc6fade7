import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest'
import { issueFirstCode, makeFirstLabLead } from '../../../server/domain/person/firstLabLead'
import { Attempts } from '../../../server/domain/session/attempts'
import { findSessionPerson } from '../../../server/domain/session/sessions'
import { addTestPerson, openTestLaboratory, type TestLaboratory } from '../../support/laboratory'
import { NotingHasher } from '../../support/means'

let laboratory: TestLaboratory
let means: { hasher: NotingHasher, attempts: Attempts, address: string }
beforeEach(async () => {
  laboratory = await openTestLaboratory()
  means = { hasher: new NotingHasher(), attempts: new Attempts(), address: '127.0.0.1' }
})
afterEach(() => {
  vi.useRealTimers()
  laboratory.close()
})

const make = (code: string | null, signInName = 'ines') => makeFirstLabLead(laboratory.db, { code: code ?? '', name: 'Ines Vane', signInName, password: 'tangle ferry cobalt' }, means)
const WRONG = 'not the code on the console'

describe('the first lab lead', () => {
  it('is made with the code of the console, typed in any case and with spaces', async () => {
    const code = issueFirstCode(laboratory.db)
    expect(code).toMatch(/^([2-9A-HJKMNP-TV-Z]{4}-){5}[2-9A-HJKMNP-TV-Z]{4}$/)
    const { secret } = await make(` ${code?.toLowerCase().replaceAll('-', ' ')}`)
    expect(findSessionPerson(laboratory.db, secret)).toMatchObject({ name: 'Ines Vane', signInName: 'ines', roles: ['labLead'] })
  })

  it('is made once: the code opens nothing afterwards, and there is no new one', async () => {
    const code = issueFirstCode(laboratory.db)
    await make(code)
    await expect(make(code, 'other')).rejects.toMatchObject({ kind: 'notFound' })
    expect(issueFirstCode(laboratory.db)).toBeNull()
  })

  it('is one person when two are made at once', async () => {
    const code = issueFirstCode(laboratory.db)
    const results = await Promise.allSettled([make(code, 'ines'), make(code, 'other')])
    expect(results.map(result => result.status)).toEqual(['fulfilled', 'rejected'])
  })

  it('needs the code of the last start, of the last 24 hours', async () => {
    const former = issueFirstCode(laboratory.db)
    const code = issueFirstCode(laboratory.db)
    await expect(make(former)).rejects.toThrow(WRONG)
    vi.useFakeTimers({ now: Date.now() + 24 * 3_600_000, toFake: ['Date'] })
    await expect(make(code)).rejects.toThrow(WRONG)
  })

  it('cannot be had by guessing', async () => {
    const code = issueFirstCode(laboratory.db)
    for (let at = 0; at < 30; at++) await expect(make(`WRNG-${at}`)).rejects.toThrow(WRONG)
    await expect(make(code)).rejects.toMatchObject({ kind: 'tooMany' })
  })

  it('cannot be made where there is any account', async () => {
    const code = issueFirstCode(laboratory.db)
    addTestPerson(laboratory, 'student')
    await expect(make(code)).rejects.toMatchObject({ kind: 'notFound' })
  })
})
