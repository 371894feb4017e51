import { render, screen } from '@testing-library/react'
import userEvent, { type UserEvent } from '@testing-library/user-event'
import { eq } from 'drizzle-orm'
import { vi } from 'vitest'
import { DayProvider } from '@/app/_crew/day-context'
import { SignOnScreens } from '@/app/sign-on/_screens/sign-on-app'
import * as tables from '@/db/schema'
import { newId } from '@/lib/platform/ids'
import type { Role } from '@/lib/permissions/policy'
import { layOutDesk } from '../support/desk-list'
import { aSyncPaddock, type Phone, type SyncPaddock } from '../support/sync-paddock'

/** A desk: a real day client over a memory store, a real server behind a fake network, and the screens. */
export interface Desk {
  readonly paddock: SyncPaddock
  readonly phone: Phone
  readonly user: UserEvent
  readonly drivers: readonly string[]
  readonly press: (name: string | RegExp) => Promise<void>
  /** Draws the screen at an address below `/sign-on`. */
  readonly open: (path?: string) => void
}

interface DeskOptions {
  readonly roles?: readonly Role[]
  readonly cars?: number
  /** The first driver is under age. */
  readonly hasMinor?: boolean
  /** Briefings of the day, minutes after midnight. */
  readonly briefings?: readonly number[]
}

/** A desk at 07:30 with the cars 47, 48 … and a driver in each, the day loaded and nobody seen. */
export async function aDesk({ roles = ['sign-on'], cars = 3, hasMinor = false, briefings = [] }: DeskOptions = {}): Promise<Desk> {
  HTMLDialogElement.prototype.showModal = function showModal() {
    this.open = true
  }
  vi.spyOn(window, 'scrollTo').mockReturnValue()
  localStorage.clear()
  const paddock = await aSyncPaddock({ cars })
  layOutDesk(paddock)
  paddock.change((database) => {
    const club = database.select().from(tables.event).where(eq(tables.event.id, paddock.event)).get()?.clubId ?? ''
    const midnight = Date.UTC(2026, 4, 9)
    for (const minute of briefings)
      database
        .insert(tables.timetableBlock)
        .values({
          id: newId(),
          clubId: club,
          eventId: paddock.event,
          day: '2026-05-09',
          kind: 'briefing',
          groupId: null,
          session: null,
          startsAt: midnight + minute * 60_000,
          endsAt: midnight + (minute + 15) * 60_000,
          noiseLimitDb: null,
        })
        .run()
    if (hasMinor)
      database
        .update(tables.person)
        .set({ minor: true })
        .where(eq(tables.person.id, paddock.drivers[0] as string))
        .run()
  })
  const phone = await paddock.phone(roles)
  await phone.day.loadDay()
  vi.spyOn(Date, 'now').mockImplementation(() => paddock.time.now)
  const user = userEvent.setup({ delay: null })
  return {
    paddock,
    phone,
    user,
    drivers: paddock.drivers,
    press: async (name) => {
      await user.click(await screen.findByRole('button', { name }))
    },
    open: (path = '/sign-on') => {
      window.history.replaceState(null, '', path)
      render(
        <DayProvider client={phone.day}>
          <SignOnScreens />
        </DayProvider>,
      )
    },
  }
}
