declare module '#workers' {
  /** The bundled text of each file in server/workers, by its name. */
  const sources: Record<string, string>
  export default sources
}

declare module '#migrations' {
  import type { MigrationMeta } from 'drizzle-orm/migrator'

  const migrations: MigrationMeta[]
  export default migrations
}
