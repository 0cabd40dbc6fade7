import { index, integer, primaryKey, real, sqliteTable, text } from 'drizzle-orm/sqlite-core'
import type { Polarity, TimeWindow } from '../../../shared/schemas/method'
import type { AmountUnit, SampleField, SampleKind, Side } from '../../../shared/schemas/sample'
import { createdAt, id, moment } from './columns'
import { people } from './people'

/** How samples are run. Studies with the same method can be compared in time. */
export const methods = sqliteTable('methods', {
  id: id(),
  name: text().notNull(),
  column: text().notNull().default(''),
  gradient: text().notNull().default(''),
  polarity: text().$type<Polarity>().notNull(),
  voidMinutes: real(),
  /** Times sent to waste, minutes. */
  divertWindows: text({ mode: 'json' }).$type<TimeWindow[]>().notNull().default([]),
  remark: text().notNull().default(''),
  createdBy: text().notNull().references(() => people.id),
  createdAt: createdAt(),
  archivedAt: moment(),
})

export const studies = sqliteTable('studies', {
  id: id(),
  title: text().notNull(),
  question: text().notNull().default(''),
  matrix: text().notNull().default(''),
  /** What the two sides are called, as a person reads them. */
  sideAName: text().notNull().default('A'),
  sideBName: text().notNull().default('B'),
  methodId: text().notNull().references(() => methods.id),
  /** A restricted study is seen by its members only. */
  restricted: integer({ mode: 'boolean' }).notNull().default(false),
  createdBy: text().notNull().references(() => people.id),
  createdAt: createdAt(),
  lastActivityAt: createdAt(),
  archivedAt: moment(),
}, table => [index('studies_method').on(table.methodId)])

export const studyMembers = sqliteTable('study_members', {
  studyId: text().notNull().references(() => studies.id, { onDelete: 'cascade' }),
  personId: text().notNull().references(() => people.id, { onDelete: 'cascade' }),
}, table => [primaryKey({ columns: [table.studyId, table.personId] })])

/** One vial as injected. */
export const samples = sqliteTable('samples', {
  id: id(),
  studyId: text().notNull().references(() => studies.id, { onDelete: 'cascade' }),
  /** Place in the sample sheet. */
  position: integer().notNull(),
  name: text().notNull(),
  kind: text().$type<SampleKind>().notNull().default('sample'),
  side: text().$type<Side>(),
  /** What was independently taken and worked up; injections of one preparation share it. */
  preparation: text().notNull().default(''),
  amount: real(),
  amountUnit: text().$type<AmountUnit>().notNull().default('mg'),
  volumeMl: real(),
  dilution: real(),
  injectionUl: real(),
  runOrder: integer(),
  batch: text().notNull().default(''),
  /** Who wrote each cell last, so that two people at one sheet can be told of each other. */
  writtenBy: text({ mode: 'json' }).$type<Partial<Record<SampleField, string>>>().notNull().default({}),
  createdAt: createdAt(),
}, table => [index('samples_study').on(table.studyId)])
