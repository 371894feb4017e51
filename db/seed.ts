import { now } from '@/lib/platform/clock'
import { assertDatabase } from './assert-database'
import { db } from './client'
import { migrateDatabase } from './migrate'
import { demoEmail, MARRAM, MARRAM_ACCOUNTS } from './scenarios/marram'
import { seedMarram } from './scenarios/seed-marram'
import { seedMarramEntrant } from './scenarios/seed-marram-entrant'
import { seedMarramEntries } from './scenarios/seed-marram-entries'

// `npm run seed`: the demo club and its event of today into LOCKWIRE_DB. Run twice it changes nothing. Prints sign-ins and links as JSON.
const database = db()
migrateDatabase(database)
assertDatabase(database)
const seeded = await seedMarram(database, now())
seedMarramEntries(database, seeded, now())
seedMarramEntrant(database, seeded, now())
database.$client.pragma('wal_checkpoint(TRUNCATE)')
database.$client.close()

const said = {
  event: seeded.eventId,
  firstDay: seeded.firstDay,
  lastDay: seeded.lastDay,
  signIns: MARRAM_ACCOUNTS.map(({ role }) => ({ role, email: demoEmail(role), password: MARRAM.password })),
  links: [
    { what: 'Sign-in', path: '/sign-in' },
    { what: 'Board', path: `/events/${seeded.eventId}/board` },
    { what: 'Bay', path: '/bay' },
    { what: 'Pit exit', path: '/pit-exit' },
    { what: 'Inbox', path: '/inbox' },
    { what: 'Entrant’s cars and entry', path: '/cars' },
  ],
}
process.stdout.write(`${JSON.stringify(said, null, 2)}\n`)
