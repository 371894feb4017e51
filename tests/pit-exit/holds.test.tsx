import { cleanup, screen, waitFor, within } from '@testing-library/react'
import userEvent from '@testing-library/user-event'
import { expect, test, vi } from 'vitest'
import { axeFindings } from '../bay/axe-findings'
import { aPitExit, type PitExit } from './a-pit-exit'
import { camera } from './fake-scanner'

vi.mock('@/lib/scanner/html5-qrcode-scanner', async () => ({ startScanner: (await import('./fake-scanner')).fakeScanner }))

const held = () => within(screen.getAllByRole('region', { name: 'Hold list' }).at(-1) as HTMLElement)
const holdsOf = (pit: PitExit) => pit.marshal.day.log(`car:${pit.car}`).flatMap(({ record }) => (record.kind === 'hold' ? [record] : []))

test('[P2 P4] a hold typed here makes the car HOLD at once on this device, with no network, and puts its number on the hold list', async () => {
  const pit = await aPitExit()
  pit.goOffline()
  pit.open()
  camera.shows(pit.qrText)
  await screen.findByText('PASSED')

  await pit.press('Hold 47')
  await pit.press('light contact')

  expect(await screen.findByText('HOLD')).toBeInTheDocument()
  const answer = document.querySelector('[data-slot=answer-screen]')
  expect(answer).toHaveAttribute('data-state', 'held')
  expect(answer?.querySelector('.text-2xl p')).toHaveTextContent(/^light contact, 07:30; Body to be seen$/)
  expect(held().getByRole('button', { name: /^47/ })).toBeInTheDocument()
  expect(holdsOf(pit)).toMatchObject([{ reason: 'contact', stations: ['body'], stickerRemoved: null }])
  expect(pit.marshal.day.status().unsent).toBe(1)
})

test('a hold by number alone is two presses after the digits, and the sticker is said with it', async () => {
  const pit = await aPitExit()
  pit.open()

  await pit.keyIn('47')
  await pit.press('Hold it')
  await userEvent.click(screen.getByRole('radio', { name: 'still on' }))
  await pit.press('light contact')

  expect(await screen.findByText('HOLD')).toBeInTheDocument()
  expect(screen.getByText(/Its sticker was left on: take it off/)).toBeInTheDocument()
  expect(holdsOf(pit)).toMatchObject([{ stickerRemoved: false }])
})

test('something that no reason fits can be said too, and then only the chief lifts it', async () => {
  const pit = await aPitExit()
  pit.open()
  await pit.keyIn('47')
  await pit.press('Hold it')

  await pit.press('Something else')

  expect(await screen.findByText(/Something else, .*only the chief lifts it/)).toBeInTheDocument()
})

test('a number that no entry has cannot be held', async () => {
  const pit = await aPitExit()
  pit.open()

  await pit.keyIn('999')

  expect(screen.getByRole('button', { name: 'Hold it' })).toBeDisabled()
})

test('a hold that cannot be saved says so, keeps the sheet open, and holds nothing', async () => {
  const pit = await aPitExit()
  pit.open()
  camera.shows(pit.qrText)
  await pit.press('Hold 47')
  await pit.marshal.day.lock()

  await pit.press('light contact')

  expect(await screen.findByRole('alert')).toHaveTextContent(/unlock/i)
  expect(holdsOf(pit)).toEqual([])
  expect(screen.getByRole('heading', { name: 'Hold 47, because …' })).toBeInTheDocument()
})

async function hear(pit: PitExit, numbers: string, count: string) {
  await pit.press(/^list/)
  if (numbers !== '') await userEvent.type(screen.getByLabelText('Numbers that may not run'), numbers)
  await userEvent.type(screen.getByLabelText('Live passes'), count)
  await pit.press('Take it in')
}

test('[P5] a read-back that agrees makes an old list count as fresh, and is recorded', async () => {
  const pit = await aPitExit()
  pit.later(45)
  pit.open()
  expect(screen.getByText('held when last heard')).toBeInTheDocument()

  await hear(pit, '', '1')

  expect(await screen.findByText('The count agrees: this list counts as fresh from now.')).toBeInTheDocument()
  expect(screen.getByText('held now')).toBeInTheDocument()
  const event = pit.marshal.day.status().event?.id ?? ''
  const said = () =>
    pit.marshal.day
      .log(`event:${event}`)
      .flatMap(({ record }) => ('notes' in record ? (record.notes ?? []) : []))
      .map((hash) => pit.marshal.day.note(hash))
  await waitFor(() => expect(said()).toEqual([expect.stringContaining('1 live passes heard, 1 counted here; agrees.')]))
})

test('[P5] a read-back that does not agree still stops what it names, over a reload too, and the list stays old', async () => {
  const pit = await aPitExit()
  pit.later(45)
  pit.open()

  await hear(pit, '47', '9')

  expect(await screen.findByText(/It does not agree/)).toBeInTheDocument()
  expect(held().getByRole('button', { name: /^47/ })).toBeInTheDocument()
  cleanup()
  pit.open()
  expect(screen.getByText('held when last heard')).toBeInTheDocument()
  camera.shows(pit.qrText)
  expect(await screen.findByText('HOLD')).toBeInTheDocument()
})

test('nothing about either screen is wrong for those who hear it', async () => {
  const pit = await aPitExit({ coDriver: true })
  pit.open()
  expect(await axeFindings()).toEqual([])

  camera.shows(pit.qrText)
  await screen.findByText('CHECK')
  expect(await axeFindings()).toEqual([])
})
