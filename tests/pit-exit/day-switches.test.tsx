import { screen, waitFor, within } from '@testing-library/react'
import userEvent from '@testing-library/user-event'
import { expect, test, vi } from 'vitest'
import { axeFindings } from '../bay/axe-findings'
import { finds, one, presents } from '../support/sync-walk'
import { aPitExit, type PitExit } from './a-pit-exit'

vi.mock('@/lib/scanner/html5-qrcode-scanner', async () => ({ startScanner: (await import('./fake-scanner')).fakeScanner }))

const recordsOf = (pit: PitExit, key: string, kind: string) =>
  pit.marshal.day.log(key as `car:${string}`).flatMap(({ record }) => (record.kind === kind ? [record] : []))
const said = (pit: PitExit) => recordsOf(pit, `event:${pit.paddock.event}`, 'day')

async function ask47(pit: PitExit) {
  await pit.keyIn('47')
  await pit.press('Ask')
}

async function toBrakes(pit: PitExit, trigger: object) {
  await one(pit.bay.day, { kind: 'recall', subject: { car: pit.car }, stations: ['brakes'], checks: [], trigger } as never)
  await pit.bay.day.drain()
  await pit.marshal.day.drain()
}

test('[F13] “session 1 is over” asks once more, is a record, and the recalled car is HOLD on this device at once, offline', async () => {
  const pit = await aPitExit()
  const group = pit.marshal.day.snapshot()?.groups[0]?.id ?? ''
  await toBrakes(pit, { when: 'session-over', group, session: 1 })
  pit.goOffline()
  pit.open()
  await pit.press('Which group is running?')
  await pit.press('Session 1 of A is over')
  expect(said(pit)).toEqual([])
  await pit.press('Session 1 of A is over')

  expect(await screen.findByRole('button', { name: 'Session 2 of A is over' })).toBeVisible()
  expect(said(pit)).toMatchObject([{ says: { what: 'session-over', group, session: 1 } }])
  await pit.press('Pit lane open to all groups')
  await ask47(pit)
  expect(await screen.findByText('HOLD')).toBeInTheDocument()
  expect(screen.getByText(/recall due: to be shown after its session.*Brakes to be seen/)).toBeInTheDocument()
})

test('said by mistake it can be left: nothing is recorded', async () => {
  const pit = await aPitExit()
  pit.open()
  await pit.press('Which group is running?')
  await pit.press('Wet is declared')
  await pit.press('Not now')
  expect(said(pit)).toEqual([])
  expect(screen.getByText('Wet is not declared.')).toBeVisible()
})

test('[F13] wet declared touches the car with a check for the wet, and no other; dry again it is no longer held for it', async () => {
  const pit = await aPitExit()
  const other = pit.paddock.cars[1] as string
  await presents(pit.bay.day, other, { cage: false, slicks: true })
  await pit.bay.day.drain()
  await pit.marshal.day.drain()
  pit.open()
  await pit.press('Which group is running?')
  await pit.press('Wet is declared')
  await pit.press('Wet is declared')
  expect(await screen.findByText('Wet since 07:30.')).toBeVisible()
  expect(pit.marshal.day.state(`car:${other}`).blocks).toMatchObject([{ kind: 'wet' }])
  expect(pit.marshal.day.state(`car:${pit.car}`).blocks).toEqual([])
  await pit.press('Wet is over')
  await pit.press('Wet is over')
  await waitFor(() => expect(pit.marshal.day.state(`car:${other}`).blocks).toEqual([]))
})

test('[F13] a recall whose hour has come blocks by this device’s clock; once said, it is due for everybody and the bay can end it', async () => {
  const pit = await aPitExit()
  await toBrakes(pit, { when: 'time', at: pit.paddock.time.now + 5 * 60_000 })
  pit.later(10)
  pit.open()
  await ask47(pit)
  expect(await screen.findByText(/Recall due by this device’s clock: to be shown at 07:35, 07:35/)).toBeInTheDocument()
  await pit.press('Next car')
  await pit.press('Which group is running?')
  await pit.press('Due at 07:35: say so')
  await pit.press('Due at 07:35: say so')
  await waitFor(() => expect(said(pit)).toHaveLength(1))
  await pit.marshal.day.drain()
  await pit.bay.day.drain()
  expect(pit.bay.day.state(`car:${pit.car}`).verdict).toBe('held')
  await finds(pit.bay.day, pit.car, 'brakes.pads', 'ok')
  expect(pit.bay.day.state(`car:${pit.car}`).verdict).toBe('passed')
})

test('[P8] of a shared car one person is held: who it is is asked, no car is touched, and the other may drive', async () => {
  const pit = await aPitExit({ coDriver: true })
  pit.open()
  await pit.keyIn('47')
  await pit.press('Hold it')
  await pit.press('Driving standard')
  const who = within(screen.getByRole('group', { name: /who was in it/ }))
  expect(who.getAllByRole('button').map(({ textContent }) => textContent)).toEqual([
    'Driver 1',
    'Rhea Birkett',
    'Not known: all of them',
    'Another reason',
  ])
  await pit.press('Rhea Birkett')

  expect(await screen.findByText('CHECK')).toBeInTheDocument()
  expect(screen.getByText(/May go: Driver 1 \(band 118\)/)).toBeInTheDocument()
  expect(recordsOf(pit, `car:${pit.car}`, 'hold')).toEqual([])
})

test('heavy contact holds the car and the helmet of who was in it, in one action', async () => {
  const pit = await aPitExit()
  pit.open()
  await pit.keyIn('47')
  await pit.press('Hold it')
  await pit.press('Heavy contact, barrier')
  expect(await screen.findByText('HOLD')).toBeInTheDocument()
  expect(screen.getByText(/If it has high voltage: quarantine it, 15 m or more/)).toBeInTheDocument()
  expect(recordsOf(pit, `car:${pit.car}`, 'hold')).toMatchObject([{ reason: 'heavy-contact' }])
  expect(recordsOf(pit, `person:${pit.driver}`, 'hold')).toMatchObject([{ reason: 'heavy-contact', stations: ['helmet'] }])
})

test('a car whose number nobody read is held by its plate or looks', async () => {
  const pit = await aPitExit()
  pit.open()
  await pit.press('Hold a car by its plate or looks')
  expect(screen.getByText('Say what you see.')).toBeVisible()
  await userEvent.type(screen.getByLabelText(/^Plate, colour/), 'blue tarn')
  expect(screen.getByText('2 cars fit')).toBeVisible()
  await userEvent.type(screen.getByLabelText(/^Plate, colour/), ' ot12')
  expect(screen.getByText('1 car fits')).toBeVisible()
  await pit.press(/blue Tarn 2/)
  await pit.press('Gravel or grass')
  await waitFor(() => expect(recordsOf(pit, `car:${pit.paddock.cars[1] ?? ''}`, 'hold')).toHaveLength(1))
})

test('nothing about the switches and the reasons is wrong for those who hear it', async () => {
  const pit = await aPitExit({ coDriver: true })
  pit.open()
  await pit.press('Which group is running?')
  await pit.press('Wet is declared')
  expect(await axeFindings()).toEqual([])
  await pit.press('Not now')
  await pit.press('Pit lane open to all groups')
  await pit.keyIn('47')
  await pit.press('Hold it')
  expect(await axeFindings()).toEqual([])
  await pit.press('Another driver in it')
  expect(await axeFindings()).toEqual([])
})
