import type { Metadata } from 'next'
import { garageBook, myKit } from '@/lib/entrants/queries/my-garage'
import { now } from '@/lib/platform/clock'
import { servedDatabase } from '@/lib/platform/served-database'
import { dayReading } from '@/lib/sync/server/day-reading'
import { EntrantFrame } from '../_frame/entrant-frame'
import { guardEntrant } from '../_frame/guard-entrant'
import { KitScreen } from './_kit/kit-screen'

export const metadata: Metadata = { title: 'My kit' }

export default async function KitPage() {
  const account = await guardEntrant('/kit')
  const database = servedDatabase()
  const garage = garageBook(dayReading, database, account, now())
  const checks = garage?.book.checks.filter(({ subject, measure }) => subject === 'person' && measure !== undefined) ?? []
  return (
    <EntrantFrame title="My kit" subtitle={account.name} tab="kit">
      <KitScreen kit={myKit(database, account)} checks={checks} judgedFor={garage && { event: garage.event, lastDay: garage.lastDay }} />
    </EntrantFrame>
  )
}
