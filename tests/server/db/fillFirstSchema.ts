import type Sqlite from 'better-sqlite3'

interface Column { name: string, type: string, notnull: number, dflt_value: string | null, pk: number }
interface Reference { from: string, table: string }

/** Puts one row into every table of the first schema, parents before children: what a laboratory holds before it is migrated. */
export function fillFirstSchema(sqlite: Sqlite.Database) {
  const names = sqlite.prepare<[], { name: string }>(`SELECT name FROM sqlite_master WHERE type = 'table' AND name NOT LIKE 'sqlite_%' AND name NOT LIKE '__drizzle%' AND name <> 'laboratory'`).all().map(row => row.name)
  const filled = new Set<string>()
  const references = (table: string) => sqlite.pragma(`foreign_key_list("${table}")`) as Reference[]
  while (filled.size < names.length) {
    const ready = names.filter(name => !filled.has(name) && references(name).every(({ table }) => filled.has(table)))
    if (ready.length === 0) throw new Error('tables refer to each other in a circle')
    for (const name of ready) {
      fill(sqlite, name, references(name))
      filled.add(name)
    }
  }
}

function fill(sqlite: Sqlite.Database, table: string, references: Reference[]) {
  const columns = sqlite.pragma(`table_info("${table}")`) as Column[]
  const parents = new Map(references.map(reference => [reference.from, reference.table]))
  const value = (column: Column): string | number | Buffer => {
    const parent = parents.get(column.name)
    if (parent) return `id of ${parent}`
    if (column.pk && column.type === 'TEXT') return column.name === 'id' ? `id of ${table}` : `${column.name} of ${table}`
    if (column.type === 'BLOB') return Buffer.from([0, 0, 0, 0, 0, 0, 240, 63])
    return column.type === 'TEXT' ? '{}' : 1
  }
  const keyed = columns.map(column => ({ ...column, name: column.name, value: column.name === 'sha256' && table === 'originals' ? 'id of originals' : value(column) }))
  sqlite.prepare(`INSERT INTO "${table}" (${keyed.map(column => `"${column.name}"`).join(', ')}) VALUES (${keyed.map(() => '?').join(', ')})`).run(...keyed.map(column => column.value))
}
