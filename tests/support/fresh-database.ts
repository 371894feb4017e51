import { copyFileSync, mkdtempSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { type Db, openDatabase, useDatabase } from '@/db/client'
import { migrateDatabase } from '@/db/migrate'

let template: string | null = null

/** A real database file of its own, migrated once per worker and copied; also the one `db()` gives. Call `close` when done. */
export function freshDatabase(): { readonly database: Db; readonly file: string; readonly close: () => void } {
  const folder = mkdtempSync(join(tmpdir(), 'lockwire-'))
  const file = join(folder, 'lockwire.db')
  copyFileSync((template ??= migratedTemplate()), file)
  const database = openDatabase(file)
  useDatabase(database)
  return {
    database,
    file,
    close: () => {
      database.$client.close()
      rmSync(folder, { recursive: true, force: true })
    },
  }
}

function migratedTemplate(): string {
  const folder = mkdtempSync(join(tmpdir(), 'lockwire-template-'))
  process.on('exit', () => rmSync(folder, { recursive: true, force: true }))
  const file = join(folder, 'template.db')
  const database = openDatabase(file)
  migrateDatabase(database)
  database.$client.pragma('wal_checkpoint(TRUNCATE)')
  database.$client.close()
  return file
}
