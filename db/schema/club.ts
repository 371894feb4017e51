import { sqliteTable, text } from 'drizzle-orm/sqlite-core'

/** One club a deployment for now; every aggregate carries its id all the same. */
export const club = sqliteTable('club', {
  id: text('id').primaryKey(),
  name: text('name').notNull(),
})
