import { screen, waitFor, within } from '@testing-library/react'
import { expect, test } from 'vitest'
import { finds, one, presents, seesAll } from '../support/sync-walk'
import { aBegunBay, type Bay } from './a-bay'
import { axeFindings } from './axe-findings'

const CONTACT = { kind: 'hold', reason: 'contact', stations: ['body'], checks: [], stickerRemoved: null } as const

const recordsOf = (bay: Bay, kind: string) =>
  bay.phone.day.log(`car:${bay.car}`).flatMap(({ record }) => (record.kind === kind ? [record] : []))

/** Another phone of the crew that knows what this one knows. */
async function another(bay: Bay, ...roles: Parameters<Bay['paddock']['phone']>) {
  await bay.phone.day.drain()
  const other = await bay.paddock.phone(...roles)
  await other.day.loadDay()
  return other
}

test('a hold made in the bay is two presses, and stands there with since when, by whom and what to see again', async () => {
  const bay = await aBegunBay()
  bay.open()
  await bay.press('Hold 47')
  await bay.press('Light contact, one corner')

  const held = await screen.findByRole('region', { name: 'Held' })
  expect(held).toHaveTextContent('Light contact, one corner, since 07:30, by Crew 1.1')
  expect(held).toHaveTextContent('See again: Wheels and tyres, Brakes, Body')
  // This checklist has no station for it: said, never dropped in silence.
  expect(held).toHaveTextContent(/Look by eye as well.*suspension and steering, leaks/)
  expect(bay.state().verdict).toBe('held')
})

test('[F5] a hold can be made wider in the bay: what was added must be seen as well', async () => {
  const bay = await aBegunBay()
  await seesAll(bay.phone.day, bay.car)
  await one(bay.phone.day, { ...CONTACT, subject: { car: bay.car } })
  bay.open()
  await bay.press('More is to be seen')
  await bay.user.click(screen.getByRole('checkbox', { name: 'Seat' }))
  await bay.press('Add them to the hold')

  await waitFor(() => expect(recordsOf(bay, 'hold')).toHaveLength(2))
  expect(recordsOf(bay, 'hold')[1]).toMatchObject({ reason: 'contact', stations: ['seat'] })
  for (const check of ['body.mirror', 'body.undertray']) await finds(bay.phone.day, bay.car, check, 'ok')
  expect(bay.state().verdict).toBe('held')
  await finds(bay.phone.day, bay.car, 'seat.mounts', 'ok')
  expect(bay.state().verdict).toBe('passed')
})

test('[F5] only the chief makes a hold narrower: lifted, and held anew for what is left, in one action', async () => {
  const bay = await aBegunBay({ roles: ['chief'] })
  await one(bay.phone.day, { ...CONTACT, stations: ['body', 'seat'], subject: { car: bay.car } })
  bay.open()
  await bay.press('Lift without a new look')
  await bay.user.type(screen.getByRole('textbox', { name: 'Why it needs no new look' }), 'the seat was not touched')
  await bay.user.click(screen.getByRole('checkbox', { name: 'Body' }))
  await bay.press('Lift it, and hold it for less')

  await waitFor(() => expect(bay.state().blocks).toMatchObject([{ stations: ['body'] }]))
  expect(recordsOf(bay, 'lifted')).toHaveLength(1)
})

test('[F13] a recall is made with when and what; it waits, visible to all, and is held once due', async () => {
  const bay = await aBegunBay()
  await seesAll(bay.phone.day, bay.car)
  bay.open()
  await bay.press('Recall 47')
  expect(screen.getByRole('button', { name: 'Recall it' })).toBeDisabled()
  await bay.user.click(screen.getByRole('radio', { name: 'after session 1 of A' }))
  await bay.user.click(screen.getByRole('checkbox', { name: 'Brakes' }))
  await bay.press('Recall it')

  const coming = await screen.findByRole('region', { name: 'To be shown again' })
  expect(coming).toHaveTextContent('Recall: to be shown after session 1 of A, said 07:30, by Crew 1.1')
  expect(bay.state().verdict).toBe('passed')

  const marshal = await another(bay, ['marshal'])
  const group = marshal.day.snapshot()?.groups[0]?.id ?? ''
  await one(marshal.day, { kind: 'day', subject: { event: bay.paddock.event }, says: { what: 'session-over', group, session: 1 } })
  await marshal.day.drain()
  await bay.phone.day.drain()
  expect(await screen.findByRole('region', { name: 'Held' })).toHaveTextContent('See again: Brakes')
  await finds(bay.phone.day, bay.car, 'brakes.pads', 'ok')
  await waitFor(() => expect(screen.queryByRole('region', { name: 'Held' })).toBeNull())
})

test('a recall comes with fluid dropped: recorded with it where who holds may recall, offered in the bay where who held could not', async () => {
  const bay = await aBegunBay()
  bay.open()
  await bay.press('Hold 47')
  await bay.press('Fluid dropped')
  await waitFor(() => expect(recordsOf(bay, 'recall')).toHaveLength(1))
  // The small checklist has no leak check: the recall shows what the hold shows.
  expect(recordsOf(bay, 'recall')).toMatchObject([{ trigger: { when: 'session-over', session: 1 }, stations: ['brakes'] }])

  const marshal = await another(bay, ['marshal'])
  bay.paddock.time.now += 60_000
  await one(marshal.day, { ...CONTACT, reason: 'fluid-dropped', stations: ['brakes'], subject: { car: bay.car } })
  await marshal.day.drain()
  await bay.phone.day.drain()
  await bay.press('Recall it after session 1 of A, as belongs to it')
  await waitFor(() => expect(recordsOf(bay, 'recall')).toHaveLength(2))
  await waitFor(() => expect(screen.queryByRole('button', { name: /as belongs to it/ })).toBeNull())
})

test('[F13] a recall at a time blocks by this device’s clock at once, and the bay says who has to say so', async () => {
  const bay = await aBegunBay()
  await seesAll(bay.phone.day, bay.car)
  const at = bay.paddock.time.now + 60_000
  await one(bay.phone.day, { kind: 'recall', subject: { car: bay.car }, stations: ['brakes'], checks: [], trigger: { when: 'time', at } })
  bay.paddock.time.now += 5 * 60_000
  bay.open()
  expect(await screen.findByRole('region', { name: 'Held' })).toHaveTextContent(
    /Recall: to be shown at 07:31.*Due by this device’s clock.*The pit exit or the chief has to say so/,
  )
})

test('[F4] the chief accepts one fail with reason, conditions and an end, and its words stand where the fail stood', async () => {
  const bay = await aBegunBay({ roles: ['chief'] })
  const [first, ...rest] = bay.state().open as [string, ...string[]]
  for (const check of rest) await finds(bay.phone.day, bay.car, check, 'ok')
  await finds(bay.phone.day, bay.car, first, 'fail', { reason: 'other' })
  bay.open()
  await bay.press(/^Accept it/)
  const sheet = within(screen.getByRole('dialog'))
  expect(sheet.getByRole('button', { name: 'Accept it with these conditions' })).toBeDisabled()
  await bay.user.type(sheet.getByRole('textbox', { name: 'Why it may run' }), 'the spare is here at noon')
  await bay.user.type(sheet.getByRole('textbox', { name: /^Only with these conditions/ }), 'three laps at a time')
  await bay.user.click(sheet.getByRole('radio', { name: 'the end of Sat 9 May 2026' }))
  await bay.press('Accept it with these conditions')

  await waitFor(() => expect(bay.state().verdict).toBe('passed with advisories'))
  expect(recordsOf(bay, 'dispensation')).toMatchObject([{ until: '2026-05-09', conditions: 'three laps at a time' }])
  expect(screen.getByRole('region', { name: 'Open and noted' })).toHaveTextContent(
    'fail accepted by the chief, to the end of Sat 9 May 2026. Only with: three laps at a time. Because: the spare is here at noon',
  )
})

test('[F2 F4] two who differ are a diamond for everybody; the chief sees both looks and ends it by a ruling that names both', async () => {
  const bay = await aBegunBay({ roles: ['chief'] })
  const other = await another(bay, ['scrutineer'])
  await finds(bay.phone.day, bay.car, 'seat.mounts', 'ok')
  await finds(other.day, bay.car, 'seat.mounts', 'fail', { reason: 'other' })
  await other.day.drain()
  await bay.phone.day.drain()
  bay.open()

  const noted = screen.getByRole('region', { name: 'Open and noted' })
  expect(noted).toHaveTextContent('Two looks differ.')
  expect(within(noted).getByRole('img', { name: /two looks differ/ })).toHaveAttribute('data-state', 'ask')
  await bay.press(/^Rule: /)
  const looks = within(screen.getByRole('list', { name: 'The looks that differ' })).getAllByRole('listitem')
  expect(looks.map(({ textContent }) => textContent).sort()).toEqual([
    expect.stringContaining('failCrew 2.1, 07:30'),
    expect.stringContaining('okCrew 1.1, 07:30'),
  ])
  await bay.user.click(screen.getByRole('radio', { name: 'advisory' }))
  await bay.user.type(screen.getByRole('textbox', { name: 'Why' }), 'one bolt of four is the maker’s own length')
  await bay.press('Rule: advisory')

  await waitFor(() => expect(bay.state().checks.get('seat.mounts')).toMatchObject({ standing: 'advisory', disagreement: false }))
  expect(recordsOf(bay, 'ruling')[0]).toMatchObject({ basis: [expect.any(String), expect.any(String)] })
})

test('[F4] where figures fail, a ruling can only say fail; where nobody disagreed there is nothing to rule on', async () => {
  const bay = await aBegunBay({ roles: ['chief'] })
  const other = await another(bay, ['scrutineer'])
  const judgement = { outcome: 'fail', code: 'tyre-tread.worn', facts: {} }
  await finds(bay.phone.day, bay.car, 'wheels.tread', 'ok')
  await finds(other.day, bay.car, 'wheels.tread', 'fail', { reason: 'other', measured: { depthMm: 1 }, judgement })
  await other.day.drain()
  await bay.phone.day.drain()
  bay.open()
  await bay.press(/^Rule: /)
  expect(screen.getAllByRole('radio').map((radio) => radio.closest('label')?.textContent)).toEqual(['fail'])
})

test('[F7] a pass is declared void with a reason and is dead for good', async () => {
  const bay = await aBegunBay({ roles: ['chief'] })
  await seesAll(bay.phone.day, bay.car)
  await bay.phone.day.issuePass({ entry: bay.car, passengerSeatUsable: false })
  bay.open()
  await bay.press(/^Void: /)
  await bay.user.type(screen.getByRole('textbox', { name: 'Why' }), 'stuck on the wrong car')
  await bay.press('Declare it void')
  await waitFor(() => expect(bay.state().passes).toMatchObject([{ state: 'dead', killedBy: [{ reason: 'void' }] }]))
})

test('[T1] a record that was set aside is shown with why, and the chief may adopt it', async () => {
  const bay = await aBegunBay({ roles: ['chief'] })
  const other = await another(bay, ['scrutineer'])
  const shown = { number: '74', plateTail: bay.phone.day.entry(bay.car)?.plateTail ?? '' }
  await finds(other.day, bay.car, 'seat.mounts', 'ok', { shown })
  await other.day.drain()
  await bay.phone.day.drain()
  expect(bay.state().checks.get('seat.mounts')?.standing).toBe('not-seen')
  bay.open()
  await bay.press(/^Adopt: Set aside: a finding/)
  expect(screen.getByRole('dialog')).toHaveTextContent('Set aside: made while the screen showed another number or plate.')
  await bay.user.type(screen.getByRole('textbox', { name: 'Why it counts all the same' }), 'he stood at this car, I saw it')
  await bay.press('Adopt it')
  await waitFor(() => expect(bay.state().checks.get('seat.mounts')?.standing).toBe('ok'))
})

test('[M3] a scrutineer is offered none of it, and the chief on a shared device is told why', async () => {
  const scrutineer = await aBegunBay()
  await finds(scrutineer.phone.day, scrutineer.car, 'seat.mounts', 'fail', { reason: 'other' })
  scrutineer.open()
  expect(screen.queryByRole('heading', { name: 'For the chief' })).toBeNull()

  const shared = await scrutineer.paddock.phone(['chief'], ['scrutineer'])
  await scrutineer.phone.day.drain()
  await shared.day.loadDay()
  const bay = { ...scrutineer, phone: shared }
  await presents(shared.day, bay.car)
  const { render } = await import('@testing-library/react')
  const { DayProvider } = await import('@/app/_crew/day-context')
  const { BayScreens } = await import('@/app/bay/_screens/bay-app')
  render(
    <DayProvider client={shared.day}>
      <BayScreens />
    </DayProvider>,
  )
  expect(screen.getByText(/enrolled for the chief alone/)).toBeVisible()
  expect(screen.queryByRole('button', { name: /^Accept it/ })).toBeNull()
})

test('nothing about the car’s screen with all of it is wrong for those who hear it', async () => {
  const bay = await aBegunBay({ roles: ['chief'] })
  await finds(bay.phone.day, bay.car, 'seat.mounts', 'fail', { reason: 'other' })
  await one(bay.phone.day, { ...CONTACT, subject: { car: bay.car } })
  bay.open()
  await bay.press(/^Accept it/)
  expect(await axeFindings()).toEqual([])
})
