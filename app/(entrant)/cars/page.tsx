import type { Metadata } from 'next'
import { garageBook, myCars, myEntries } from '@/lib/entrants/queries/my-garage'
import { now } from '@/lib/platform/clock'
import { servedDatabase } from '@/lib/platform/served-database'
import { dayReading } from '@/lib/sync/server/day-reading'
import { EntrantFrame } from '../_frame/entrant-frame'
import { guardEntrant } from '../_frame/guard-entrant'
import { AddCar } from './_cars/add-car'
import { CarList } from './_cars/car-list'
import { EntryList } from './_cars/entry-list'

export const metadata: Metadata = { title: 'My cars' }

export default async function CarsPage() {
  const account = await guardEntrant('/cars')
  const database = servedDatabase()
  const cars = myCars(database, account)
  const garage = garageBook(dayReading, database, account, now())
  return (
    <EntrantFrame title="My cars" subtitle={account.name} tab="cars">
      <div className="grid gap-8">
        <EntryList entries={myEntries(database, account)} />
        <CarList cars={cars} book={garage?.book ?? null} />
        <AddCar />
      </div>
    </EntrantFrame>
  )
}
