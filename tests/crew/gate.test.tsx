import { render, screen, waitFor } from '@testing-library/react'
import userEvent from '@testing-library/user-event'
import type { ReactNode } from 'react'
import { beforeEach, expect, test, vi } from 'vitest'
import { DayProvider } from '@/app/_crew/day-context'
import { HandOver } from '@/app/_crew/hand-over'
import { LoadScreen } from '@/app/_crew/load-screen'
import { MachineProblem } from '@/app/_crew/machine-problem'
import { UnlockScreen } from '@/app/_crew/unlock-screen'
import type { DayClient } from '@/lib/sync/client/day-client'
import { aSyncPaddock, PIN } from '../support/sync-paddock'

const user = userEvent.setup({ delay: null })

beforeEach(() => localStorage.clear())

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
