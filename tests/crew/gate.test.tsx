import { render, screen, waitFor } from '@testing-library/react'
import userEvent from '@testing-library/user-event'
import type { ReactNode } from 'react'
import { afterEach, beforeEach, expect, test, vi } from 'vitest'
import { DayProvider } from '@/app/_crew/day-context'
import { HandOver } from '@/app/_crew/hand-over'
import { LoadScreen } from '@/app/_crew/load-screen'
import { MachineProblem } from '@/app/_crew/machine-problem'
import { UnlockScreen } from '@/app/_crew/unlock-screen'
import type { DayClient } from '@/lib/sync/client/day-client'
import { keepNothing, keepScreens } from '../support/kept-screens'
import { aSyncPaddock, PIN } from '../support/sync-paddock'
import { presents } from '../support/sync-walk'

const user = userEvent.setup({ delay: null })

beforeEach(() => {
  localStorage.clear()
  // jsdom has no modal dialogs; what is asked here is what stands inside.
  HTMLDialogElement.prototype.showModal = function showModal() {
    this.open = true
  }
  window.history.replaceState(null, '', '/bay')
  keepScreens(['/bay'])
})
afterEach(keepNothing)

function draw(day: DayClient, screenOf: ReactNode): void {
  render(<DayProvider client={day}>{screenOf}</DayProvider>)
}

async function aPhone(...roles: Parameters<Awaited<ReturnType<typeof aSyncPaddock>>['phone']>) {
  const paddock = await aSyncPaddock()
  return { paddock, phone: await paddock.phone(...roles) }
}

test('[M3] a shared tablet is handed over, and the next person says with six digits who they are', async () => {
  const { phone } = await aPhone(['scrutineer'], ['helper'])
  draw(
    phone.day,
    <>
      <HandOver />
      <UnlockScreen />
    </>,
  )
  await user.click(screen.getByRole('button', { name: 'Hand it over' }))
  await waitFor(() => expect(phone.day.status().unlocked).toBeNull())

  await user.click(screen.getByRole('button', { name: 'Crew 1.2, helper' }))
  await user.type(screen.getByLabelText('Your six digits'), PIN)
  await user.click(screen.getByRole('button', { name: 'Unlock' }))
  await waitFor(() => expect(phone.day.status().unlocked?.name).toBe('Crew 1.2'))
})

test('wrong digits are said in three sentences, and whoever forgot theirs sets new ones', async () => {
  const { phone } = await aPhone()
  await phone.day.lock()
  draw(phone.day, <UnlockScreen />)
  await user.type(screen.getByLabelText('Your six digits'), '000000')
  await user.click(screen.getByRole('button', { name: 'Unlock' }))
  expect(await screen.findByText('These are not the six digits set on this device.')).toBeVisible()
  expect(screen.getByText('Try again, or set new digits.')).toBeVisible()

  await user.click(screen.getByRole('button', { name: 'Set new digits' }))
  await user.type(screen.getByLabelText('Choose six digits for this device'), '135790')
  await user.click(screen.getByRole('button', { name: 'Set them and go on' }))
  await waitFor(() => expect(phone.day.status().unlocked?.name).toBe('Crew 1.1'))
})

test('the day is loaded with real counts, and the device says that it is ready offline', async () => {
  const { phone } = await aPhone()
  const onReady = vi.fn()
  draw(phone.day, <LoadScreen onReady={onReady} />)
  expect(await screen.findByRole('heading', { name: 'Ready offline' })).toBeVisible()
  expect(screen.getByText('2 loaded')).toBeVisible()
  await user.click(screen.getByRole('button', { name: 'Begin' }))
  expect(onReady).toHaveBeenCalledOnce()
})

test('a browser that does not keep the screens is not called ready, and one may go on all the same', async () => {
  keepNothing()
  const { phone } = await aPhone()
  const onReady = vi.fn()
  draw(phone.day, <LoadScreen onReady={onReady} />)
  expect(await screen.findByRole('heading', { name: 'Not ready for offline' })).toBeVisible()
  expect(screen.getByText('This browser does not keep these screens.')).toBeVisible()
  await user.click(screen.getByRole('button', { name: 'Go on all the same' }))
  expect(onReady).toHaveBeenCalledOnce()
})

test('without the network loading says so, keeps what is here, and can be tried again', async () => {
  const { phone } = await aPhone()
  phone.network.weather = () => 'drop'
  draw(phone.day, <LoadScreen onReady={vi.fn()} />)
  expect(await screen.findByText('The server could not be reached.')).toBeVisible()
  expect(screen.queryByRole('button', { name: /^(Begin|Go on all the same)$/ })).toBeNull()
  phone.network.weather = () => 'pass'
  await user.click(screen.getByRole('button', { name: 'Load again' }))
  expect(await screen.findByRole('heading', { name: 'Ready offline' })).toBeVisible()
  expect(screen.queryByText('The server could not be reached.')).toBeNull()
})

test('a device that is nearly full says so before it matters, with what to do', async () => {
  const { phone } = await aPhone()
  phone.disk.leftBytes = 4_000_000
  draw(phone.day, <LoadScreen onReady={vi.fn()} />)
  expect(await screen.findByRole('heading', { name: 'Not ready for offline' })).toBeVisible()
  expect(screen.getByText('This device is nearly full.')).toBeVisible()
  expect(screen.getByRole('button', { name: 'Go on all the same' })).toBeVisible()
})

test('a device that fills up while it works is loud on every screen; no network is not', async () => {
  const { phone } = await aPhone()
  await phone.day.loadDay()
  phone.network.weather = () => 'drop'
  await phone.day.drain()
  draw(phone.day, <MachineProblem />)
  expect(screen.getByRole('alert')).toBeEmptyDOMElement()

  phone.disk.leftBytes = 4_000_000
  phone.network.weather = () => 'pass'
  await phone.day.loadDay()
  expect(await screen.findByText(/^This device is nearly full\./)).toBeVisible()
  expect(screen.getByText(/^Send what is unsent and free some room/)).toBeInTheDocument()
})

/** A phone with one record that the server would not take. */
async function aRefusedRecord() {
  const made = await aPhone()
  await made.phone.day.loadDay()
  await presents(made.phone.day, made.paddock.cars[0] as string)
  made.phone.network.next.push(422)
  await made.phone.day.push()
  draw(made.phone.day, <MachineProblem />)
  await user.click(screen.getByRole('button', { name: 'Needs attention: 1' }))
  expect(await screen.findByText(/^presented of 47/)).toBeVisible()
  return made
}

test('[S6] a record the server would not take is shown with why, and thrown away only by typing it', async () => {
  const { phone } = await aRefusedRecord()
  expect(screen.getByText('The server could not read it.')).toBeVisible()
  await user.click(screen.getByRole('button', { name: 'Throw it away' }))
  expect(await screen.findByText('The word typed is not the one asked for.')).toBeVisible()
  expect(phone.day.status().needsAttention).toBe(1)

  await user.type(screen.getByLabelText('To throw it away for good, type “discard”'), 'discard')
  await user.click(screen.getByRole('button', { name: 'Throw it away' }))
  await waitFor(() => expect(phone.day.status().needsAttention).toBe(0))
})

test('[S6] a record the server would not take can be sent again', async () => {
  const { paddock, phone } = await aRefusedRecord()
  await user.click(screen.getByRole('button', { name: 'Send it again' }))
  expect(await screen.findByText(/^Nothing is left\./)).toBeVisible()
  await phone.day.push()
  expect(paddock.rows()).toHaveLength(1)
})
