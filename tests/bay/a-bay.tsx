import { readFileSync } from 'node:fs'
import { resolve } from 'node:path'
import { render, screen, waitFor, within } from '@testing-library/react'
import userEvent, { type UserEvent } from '@testing-library/user-event'
import { eq } from 'drizzle-orm'
import { vi } from 'vitest'
import { DayProvider } from '@/app/_crew/day-context'
import { BayScreens } from '@/app/bay/_screens/bay-app'
// Fetched when needed by the screens; here before any test counts its time.
import '@/app/bay/_screens/car-screen'
import * as tables from '@/db/schema'
import { hashJson } from '@/lib/checklist/hash'
import type { RecordOf } from '@/lib/inspection/record'
import type { SubjectState } from '@/lib/inspection/state'
import type { Role } from '@/lib/permissions/policy'
import { one, presents } from '../support/sync-walk'
import { aSyncPaddock, LIMITS_HASH, type Phone, type SyncPaddock } from '../support/sync-paddock'

/** A bay: a real day client over a memory store, a real server behind a fake network, and the screens. */
export interface Bay {
  readonly paddock: SyncPaddock
  readonly phone: Phone
  readonly user: UserEvent
  /** The first entry: number 47. */
  readonly car: string
  readonly driver: string
  readonly state: () => SubjectState
  /** Findings on a check of the first car, oldest first. */
  readonly findings: (check: string) => readonly RecordOf<'finding'>[]
  readonly press: (name: string | RegExp) => Promise<void>
  /** Draws the screen at an address below `/bay`. */
  readonly open: (path?: string) => void
}

interface BayOptions {
  readonly roles?: readonly Role[]
  /** The shipped checklist instead of the small one of the tests. */
  readonly isShipped?: boolean
}

/** A bay at 07:30 with two cars, numbers 47 and 48, its day loaded and nobody presented. */
export async function aBay({ roles = ['scrutineer'], isShipped = false }: BayOptions = {}): Promise<Bay> {
  // jsdom has no modal dialogs and no scrolling; what is asked here is what stands inside them.
  HTMLDialogElement.prototype.showModal = function showModal() {
    this.open = true
  }
  vi.spyOn(window, 'scrollTo').mockReturnValue()
  localStorage.clear()
  const paddock = await aSyncPaddock()
  if (isShipped) ship(paddock)
  const phone = await paddock.phone(roles)
  await phone.day.loadDay()
  vi.spyOn(Date, 'now').mockImplementation(() => paddock.time.now)
  const [car, driver] = [paddock.cars[0] as string, paddock.drivers[0] as string]
  const user = userEvent.setup({ delay: null })
  return {
    paddock,
    phone,
    user,
    car,
    driver,
    state: () => phone.day.state(`car:${car}`),
    findings: (check) =>
      phone.day
        .log(`car:${car}`)
        .flatMap(({ record }) => (record.kind === 'finding' && 'check' in record && record.check === check ? [record] : [])),
    press: async (name) => {
      await user.click(await screen.findByRole('button', { name }))
    },
    open: (path = `/bay/car/${car}`) => draw(phone, path),
  }
}

/** A bay whose first car has been presented: a road car of the small checklist. */
export async function aBegunBay(options: BayOptions = {}): Promise<Bay> {
  const bay = await aBay(options)
  await presents(bay.phone.day, bay.car)
  return bay
}

/** A bay with the shipped checklist, the first car presented with a harness and no head restraint. */
export async function aHarnessBay(): Promise<Bay> {
  const bay = await aBay({ isShipped: true })
  await one(bay.phone.day, {
    kind: 'presented',
    subject: { car: bay.car },
    checklist: shippedHash,
    limits: LIMITS_HASH,
    declaration: null,
    facts: { belts: 'harness', headRestraint: false, shoulderAnchor: 'bolted', roof: 'closed', tyres: 'road' },
    depth: 'standard',
  })
  return bay
}

/** Picks one of the checks of the place that is shown. */
export async function pick(bay: Bay, short: RegExp): Promise<void> {
  const checks = await screen.findByRole('list', { name: /^Checks at/ })
  await bay.user.click(within(checks).getByRole('button', { name: short }))
}

/** Waits until the device holds so many findings on a check. */
export async function saved(bay: Bay, check: string, count = 1): Promise<RecordOf<'finding'>> {
  await waitFor(() => {
    if (bay.findings(check).length < count) throw new Error(`${check} has ${bay.findings(check).length} findings`)
  })
  return bay.findings(check).at(-1) as RecordOf<'finding'>
}

const shipped: unknown = JSON.parse(readFileSync(resolve(import.meta.dirname, '../../checklists/closed-circuit/v2.json'), 'utf8'))
const shippedHash = hashJson(shipped)

function ship(paddock: SyncPaddock): void {
  paddock.change((database) => {
    database
      .insert(tables.checklistText)
      .values({ hash: shippedHash, body: JSON.stringify(shipped) })
      .run()
    database.update(tables.event).set({ checklistHash: shippedHash }).where(eq(tables.event.id, paddock.event)).run()
  })
}

function draw(phone: Phone, path: string): void {
  window.history.replaceState(null, '', path)
  render(
    <DayProvider client={phone.day}>
      <BayScreens />
    </DayProvider>,
  )
}
