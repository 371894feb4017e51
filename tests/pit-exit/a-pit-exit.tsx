import { render, screen } from '@testing-library/react'
import userEvent from '@testing-library/user-event'
import { vi } from 'vitest'
import { DayProvider } from '@/app/_crew/day-context'
import { PitExitScreen } from '@/app/pit-exit/_screens/pit-exit-screen'
import * as tables from '@/db/schema'
import { newId } from '@/lib/platform/ids'
import type { DayClient } from '@/lib/sync/client/day-client'
import { aFinding, one, presents, seesAll } from '../support/sync-walk'
import { aSyncPaddock, CHECKLIST_HASH, LIMITS_HASH, type Phone, type SyncPaddock } from '../support/sync-paddock'

/** A paddock with car 47 passed and its driver banded, and the marshal's phone at the pit exit, its day loaded: real clients, a real server. */
export interface PitExit {
  readonly paddock: SyncPaddock
  readonly bay: Phone
  readonly marshal: Phone
  readonly car: string
  readonly driver: string
  /** What the sticker of car 47 says to a camera, and below it. */
  readonly qrText: string
  readonly typedCode: string
  readonly press: (name: string | RegExp) => Promise<void>
  readonly keyIn: (number: string) => Promise<void>
  /** The marshal's phone has no network from now on. */
  readonly goOffline: () => void
  /** Minutes go by, with a tap at their end: nobody has to unlock. */
  readonly later: (minutes: number) => void
  /** Draws the screens on the marshal's phone. */
  readonly open: () => void
}

export async function aPitExit({ coDriver = false } = {}): Promise<PitExit> {
  // jsdom has no modal dialogs; what is asked here is what stands inside them.
  HTMLDialogElement.prototype.showModal = function showModal() {
    this.open = true
  }
  HTMLDialogElement.prototype.close = function close() {
    this.open = false
  }
  localStorage.clear()
  const paddock = await aSyncPaddock({ cars: 2 })
  const [car, driver] = [paddock.cars[0] as string, paddock.drivers[0] as string]
  if (coDriver) nameCoDriver(paddock, car)
  const bay = await paddock.phone(['scrutineer'], ['sign-on'])
  const marshal = await paddock.phone(['marshal'])
  await bay.day.loadDay()
  await presents(bay.day, car)
  await seesAll(bay.day, car)
  const { qrText, typedCode } = await bay.day.issuePass({ entry: car, passengerSeatUsable: true })
  await bandFor(bay.day, car, driver)
  await bay.day.drain()
  await marshal.day.loadDay()
  vi.spyOn(Date, 'now').mockImplementation(() => paddock.time.now)
  const user = userEvent.setup({ delay: null })
  const press = async (name: string | RegExp) => {
    await user.click(await screen.findByRole('button', { name }))
  }
  return {
    paddock,
    bay,
    marshal,
    car,
    driver,
    qrText,
    typedCode,
    press,
    keyIn: async (number) => {
      for (const digit of number) await press(digit)
    },
    goOffline: () => {
      marshal.network.weather = () => 'drop'
    },
    later: (minutes) => {
      for (let left = minutes; left > 0; left -= 10) {
        paddock.time.now += Math.min(10, left) * 60_000
        marshal.day.touched()
      }
    },
    open: () => {
      render(
        <DayProvider client={marshal.day}>
          <PitExitScreen />
        </DayProvider>,
      )
    },
  }
}

function nameCoDriver(paddock: SyncPaddock, entryId: string): void {
  paddock.change((database) => {
    const owner = database.select().from(tables.entry).all()[0]
    if (!owner) throw new Error('the paddock has no entry')
    const { clubId, eventId } = owner
    const personId = newId()
    database.insert(tables.person).values({ id: personId, clubId, eventId, name: 'Rhea Birkett' }).run()
    database.insert(tables.entryPerson).values({ clubId, entryId, personId, role: 'driver' }).run()
  })
}

/** Sees a person's helmet and their fit in the car, and gives band 118. */
async function bandFor(day: DayClient, car: string, person: string): Promise<void> {
  for (const subject of [{ person }, { fit: car, person }]) {
    await one(day, {
      kind: 'presented',
      subject,
      checklist: CHECKLIST_HASH,
      limits: LIMITS_HASH,
      declaration: null,
      facts: {},
      depth: 'standard',
    })
    const key = 'fit' in subject ? (`fit:${car}:${person}` as const) : (`person:${person}` as const)
    for (const check of day.state(key).open) await one(day, { ...aFinding(day, car, check, 'ok'), subject } as never)
  }
  await day.issueBand({ person, bandNumber: '118' })
}
