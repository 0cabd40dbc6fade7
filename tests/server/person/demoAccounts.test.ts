import { mkdtempSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { afterEach, beforeEach, describe, expect, it } from 'vitest'
import { openDatabase, type LaboratoryKind, type OpenDatabase } from '../../../server/db/open'
import { demoAccounts, demoPassword } from '../../../server/domain/demo/accounts'
import { addDemoAccounts } from '../../../server/domain/demo/addDemoAccounts'
import { addPersonWithPassword } from '../../../server/domain/person/addPersonWithPassword'
import { listPeople } from '../../../server/domain/person/listPeople'
import { passwordProblem } from '../../../server/domain/session/passwordRules'
import { signIn } from '../../../server/domain/session/signIn'
import { roles } from '../../../shared/permissions'
import { passwordSchema, personSchema } from '../../../shared/schemas/person'
import { migrations } from '../../support/laboratory'
import { NotingHasher, testMeans } from '../../support/means'

let folder: string
let open: OpenDatabase | undefined
beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), 'steelyard-demo-accounts-'))
})
afterEach(() => {
  open?.close()
  open = undefined
  rmSync(folder, { recursive: true })
})
const openAs = async (kind: LaboratoryKind) => {
  open = await openDatabase(folder, kind, migrations)
  return open.db
}
const person = { name: 'Ada Quillon', signInName: 'analyst', email: '', roles: ['analyst' as const] }

describe('demo accounts', () => {
  it('are one a role, and keep the rules of every account', () => {
    expect(demoAccounts.flatMap(account => account.roles).sort()).toEqual([...roles].sort())
    for (const account of demoAccounts) {
      expect(personSchema.safeParse(account).success).toBe(true)
      expect(passwordProblem(demoPassword, account.signInName)).toBeNull()
    }
    expect(passwordSchema.safeParse(demoPassword).success).toBe(true)
  })

  it('are made once, and open with the password shown', async () => {
    const db = await openAs('demo')
    await addDemoAccounts(db, new NotingHasher())
    await addDemoAccounts(db, new NotingHasher())
    expect(listPeople(db)).toHaveLength(demoAccounts.length)
    for (const { signInName } of demoAccounts) await expect(signIn(db, { signInName, password: demoPassword }, testMeans())).resolves.toMatchObject({ signInName })
  })

  it('can\'t be made in a real laboratory', async () => {
    const db = await openAs('lab')
    expect(() => addPersonWithPassword(db, person, 'hash')).toThrow('can\'t be made in a real laboratory')
    await expect(addDemoAccounts(db, new NotingHasher())).rejects.toThrow('can\'t be made in a real laboratory')
    expect(listPeople(db)).toEqual([])
  })
})
