import { cleanup, fireEvent, render, screen, waitFor } from '@testing-library/react'
import { afterEach, beforeEach, expect, test, vi } from 'vitest'
import { TakeOutDialog } from '@/app/(organiser)/events/[event]/devices/_devices/take-out-dialog'
import type { DeviceView } from '@/lib/contracts/devices'
import { answering } from './answers'

const device: DeviceView = { id: 'd', kid: 12, name: 'Bay tablet', state: 'active', people: [], enrolledAt: 0, lastContactAt: 0, unsent: 4 }
const onDone = vi.fn(async () => undefined)

beforeEach(() => {
  onDone.mockClear()
  // jsdom has no modal dialogs; what is asked here is what stands inside.
  HTMLDialogElement.prototype.showModal = function showModal() {
    this.open = true
  }
})
afterEach(() => {
  cleanup()
  vi.unstubAllGlobals()
})

function ask(as: 'retired' | 'lost') {
  render(<TakeOutDialog eventId="e" asked={{ device, as }} onClose={() => undefined} onDone={onDone} />)
}

test('a device is taken out of use only once its number is typed; that it cannot be undone is said before', async () => {
  const asked = answering({ ok: { ...device, state: 'retired' } })
  ask('retired')
  expect(screen.getByText(/This cannot be undone/)).toBeVisible()
  expect(screen.getByText(/still held 4 unsent/)).toBeVisible()

  fireEvent.change(screen.getByLabelText(/^Type 12/), { target: { value: '1' } })
  fireEvent.click(screen.getByRole('button', { name: 'Retire it for good' }))
  expect(await screen.findByText('Type 12, the number of this device.')).toBeVisible()
  expect(asked).toEqual([])

  fireEvent.change(screen.getByLabelText(/^Type 12/), { target: { value: ' 12 ' } })
  fireEvent.click(screen.getByRole('button', { name: 'Retire it for good' }))
  await waitFor(() => expect(onDone).toHaveBeenCalledOnce())
  expect(asked.map(({ body }) => body)).toEqual([{ device: 'd', as: 'retired' }])
})

test('a refusal says what happened and nothing is taken for done', async () => {
  answering({ problem: { status: 409, code: 'device-decided', what: 'No longer active.', kept: 'It stays as it was.', todo: 'Reload.' } })
  ask('lost')
  fireEvent.change(screen.getByLabelText(/^Type 12/), { target: { value: '12' } })
  fireEvent.click(screen.getByRole('button', { name: 'Report it lost for good' }))

  expect(await screen.findByText('No longer active.')).toBeVisible()
  expect(onDone).not.toHaveBeenCalled()
})
