import type { MethodListItem, StudyView } from '#shared/types/study'

const AT = '2026-02-03T11:30:00.000Z'

export const inventedMethod: MethodListItem = {
  id: 'm1', name: 'RP 15 min', column: 'C18, 100 mm', gradient: '5 to 95 % in 12 min', polarity: 'negative', voidMinutes: 0.8,
  divertWindows: [{ startMinutes: 0, endMinutes: 0.7 }], remark: '', studies: [{ id: 's1', title: 'Two mills' }],
}

/** The study that every component of a study stands in. */
export const inventedStudy: StudyView = {
  id: 's1', title: 'Two mills', question: 'What tells them apart?', matrix: 'apple juice', restricted: false, lastActivityAt: AT, archivedAt: null,
  counts: { samples: 8, tables: 6, traces: 0, alignments: 2, comparisons: 1 }, sideAName: 'Millrace', sideBName: 'Tallow Lane', method: inventedMethod,
  createdAt: AT, createdByName: 'Ada Moss', members: [{ id: 'p1', name: 'Ada Moss', roles: ['analyst'], closed: false }],
}
