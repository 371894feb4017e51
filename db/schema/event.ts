import { index, integer, primaryKey, real, sqliteTable, text, uniqueIndex } from 'drizzle-orm/sqlite-core'
import { club } from './club'

export const event = sqliteTable(
  'event',
  {
    id: text('id').primaryKey(),
    clubId: text('club_id')
      .notNull()
      .references(() => club.id),
    /** The event's number in pass tokens, 1 to 65535, never reused. */
    code: integer('code').notNull(),
    name: text('name').notNull(),
    venue: text('venue').notNull(),
    /** IANA name. */
    timeZone: text('time_zone').notNull(),
    firstDay: text('first_day').notNull(),
    lastDay: text('last_day').notNull(),
    checklistHash: text('checklist_hash')
      .notNull()
      .references(() => checklistText.hash),
    limitsHash: text('limits_hash')
      .notNull()
      .references(() => limitsText.hash),
    defaultDepth: text('default_depth', { enum: ['look-over', 'standard', 'full'] }).notNull(),
    /** Closed circuit, or a session on which road law binds too; decides which checks apply. */
    kindOfDay: text('kind_of_day', { enum: ['closed-circuit', 'public-road'] })
      .notNull()
      .default('closed-circuit'),
    /** Every car is seen, or the must-see ones plus a sample. */
    depthPolicy: text('depth_policy', { enum: ['all', 'must-see'] }).notNull(),
    listStaleMinutes: integer('list_stale_minutes').notNull(),
    /** Counters that are never wound back: next device kid and next entry code. */
    nextKid: integer('next_kid').notNull(),
    nextEntryCode: integer('next_entry_code').notNull(),
    /** With `must-see`: one car in so many is seen whatever it is; 0 for none. */
    sampleEvery: integer('sample_every').notNull().default(0),
    /** Moved on by every change of the snapshot that devices load. */
    snapshotVersion: integer('snapshot_version').notNull(),
    createdAt: integer('created_at').notNull(),
  },
  (table) => [uniqueIndex('event_code').on(table.clubId, table.code)],
)

export const runGroup = sqliteTable(
  'run_group',
  {
    id: text('id').primaryKey(),
    clubId: text('club_id')
      .notNull()
      .references(() => club.id),
    eventId: text('event_id')
      .notNull()
      .references(() => event.id),
    name: text('name').notNull(),
    order: integer('order').notNull(),
    firstSessionAt: integer('first_session_at'),
  },
  (table) => [uniqueIndex('run_group_name').on(table.eventId, table.name), index('run_group_event').on(table.eventId)],
)

/** One line of the timetable: a group's session with its noise limit, or a time in which the bay stands still for it. */
export const timetableBlock = sqliteTable(
  'timetable_block',
  {
    id: text('id').primaryKey(),
    clubId: text('club_id')
      .notNull()
      .references(() => club.id),
    eventId: text('event_id')
      .notNull()
      .references(() => event.id),
    /** Venue day. */
    day: text('day').notNull(),
    kind: text('kind', { enum: ['session', 'briefing', 'engine-curfew', 'break'] }).notNull(),
    /** Whose it is; null: everybody's. A session has always one. */
    groupId: text('group_id').references(() => runGroup.id),
    /** The group's own count over the whole event, from 1; null for what is no session. */
    session: integer('session'),
    startsAt: integer('starts_at').notNull(),
    endsAt: integer('ends_at').notNull(),
    /** dB(A), static; null: no limit of its own. */
    noiseLimitDb: real('noise_limit_db'),
  },
  (table) => [index('timetable_block_event').on(table.eventId, table.startsAt)],
)

/** How the organiser plans the bay of one venue day; what it comes to is worked out from it. */
export const bayPlan = sqliteTable(
  'bay_plan',
  {
    eventId: text('event_id')
      .notNull()
      .references(() => event.id),
    day: text('day').notNull(),
    clubId: text('club_id')
      .notNull()
      .references(() => club.id),
    opensAt: integer('opens_at').notNull(),
    lanes: integer('lanes').notNull(),
    windowMin: integer('window_min').notNull(),
    /** Minutes a car is expected to take, and how much that scatters (standard deviation). */
    carMin: real('car_min').notNull(),
    carSdMin: real('car_sd_min').notNull(),
    /** When its windows were last told to the entrants; null while they are only planned. */
    publishedAt: integer('published_at'),
  },
  (table) => [primaryKey({ columns: [table.eventId, table.day] })],
)

/** Published checklists and limits by SHA-256 of their file, so that what a record pins can always be read again. */
export const checklistText = sqliteTable('checklist_text', { hash: text('hash').primaryKey(), body: text('body').notNull() })
export const limitsText = sqliteTable('limits_text', { hash: text('hash').primaryKey(), body: text('body').notNull() })
