import { readdirSync } from 'node:fs'
import { join } from 'node:path'
import { can, type Action, type Role } from '../../shared/permissions'
import type { TestLaboratory } from './laboratory'

/** Who asks in the rights test. The stranger is an analyst and lab lead who is no member of the study; the closed account had every role. */
export const askers = ['visitor', 'closed', 'stranger', 'analyst', 'scientist', 'reviewer', 'student', 'labLead'] as const
export type Asker = (typeof askers)[number]

/** Links a guest may hold. `closedMaker`: of a person whose account is closed now, which stays in force. `otherVersion`: opens its own version. */
export const guestLinks = ['right', 'withoutExport', 'closedMaker', 'otherVersion', 'wrong', 'ended', 'withdrawn'] as const
export type GuestLink = (typeof guestLinks)[number]
/** Where the fixture holds the secret of each. */
export const secretName = (link: GuestLink) => `${link}Secret`

/** Ids the rows put into addresses, by name. `studyId` is a restricted study whose members are the five roles. */
export type Fixture = Record<string, string>

export interface RightsRow {
  /** As the file has it: `PATCH /api/studies/[studyId]/samples`. */
  route: string
  /** The right it needs; signedIn: any account; public: everyone. */
  needs: Action | 'signedIn' | 'public'
  /** Status for those who have the right: 200 unless said. An empty body's 400 will do where the act itself is tested elsewhere. */
  ok?: number
  body?: (fixture: Fixture) => unknown
  query?: string
  /** Where a parameter of the address is filled from another id of the fixture: { alignmentId: 'practiceAlignmentId' }. */
  from?: Record<string, string>
  /** Where one asker differs from the rule. */
  except?: Partial<Record<Asker, number>>
  /** Rows below /api/shared: where a link differs from the rule that what is in force opens and all else is 404. */
  guest?: Partial<Record<GuestLink, number>>
  /** Runs before each request, on the same database as the server. */
  before?: (fixture: Fixture, laboratory: TestLaboratory) => void
}

/** One file a noun in tests/e2e/rights: its rows, and what they need to stand in the database first. */
export interface RightsFile {
  rows: RightsRow[]
  prepare?: (fixture: Fixture, laboratory: TestLaboratory) => void | Promise<void>
}

const rolesOf: Record<Exclude<Asker, 'visitor' | 'closed'>, Role[]> = {
  stranger: ['analyst', 'labLead'],
  analyst: ['analyst'],
  scientist: ['scientist'],
  reviewer: ['reviewer'],
  student: ['student'],
  labLead: ['labLead'],
}

export function expectedStatus(row: RightsRow, asker: Asker): number {
  const exception = row.except?.[asker]
  if (exception !== undefined) return exception
  const ok = row.ok ?? 200
  if (row.needs === 'public') return ok
  if (asker === 'visitor' || asker === 'closed') return 401
  if (asker === 'stranger' && row.route.includes('[studyId]')) return 404
  if (row.needs === 'signedIn') return ok
  return can({ roles: rolesOf[asker] }, row.needs) ? ok : 403
}

export function expectedGuestStatus(row: RightsRow, link: GuestLink): number {
  const closed: readonly GuestLink[] = ['wrong', 'ended', 'withdrawn']
  return row.guest?.[link] ?? (closed.includes(link) ? 404 : row.ok ?? 200)
}

/** Every route file as `METHOD /api/path`. */
export function routesIn(folder: string, path = '/api'): string[] {
  return readdirSync(folder, { withFileTypes: true }).flatMap((entry) => {
    if (entry.isDirectory()) return routesIn(join(folder, entry.name), `${path}/${entry.name}`)
    const match = /^(?<name>.+)\.(?<method>get|post|put|patch|delete)\.ts$/.exec(entry.name)
    if (!match?.groups) throw new Error(`${path}/${entry.name}: a route file names its method`)
    const { name = '', method = '' } = match.groups
    return `${method.toUpperCase()} ${name === 'index' ? path : `${path}/${name}`}`
  })
}

export function addressOf(row: RightsRow, fixture: Fixture): { method: string, path: string } {
  const [method = '', pattern = ''] = row.route.split(' ')
  const path = pattern.replaceAll(/\[(\w+)\]/g, (_, name: string) => fixture[row.from?.[name] ?? name] ?? `no-${name}-in-the-fixture`)
  return { method, path: row.query ? `${path}?${row.query}` : path }
}
