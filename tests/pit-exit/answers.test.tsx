import { act, cleanup, screen, waitFor, within } from '@testing-library/react'
import userEvent from '@testing-library/user-event'
import { expect, test, vi } from 'vitest'
import { scanProblem } from '@/lib/scanner/scan-problem'
import { aPitExit } from './a-pit-exit'
import { camera } from './fake-scanner'

// From a file of its own: one that imports the screen would wait for this mock, which would wait for it.
vi.mock('@/lib/scanner/html5-qrcode-scanner', async () => ({ startScanner: (await import('./fake-scanner')).fakeScanner }))

/** The answer that fills the screen. */
async function theAnswer(word: string) {
  const said = await screen.findByText(word)
  const answer = said.closest<HTMLElement>('[data-slot=answer-screen]')
  if (!answer) throw new Error(`${word} stands in no answer`)
  const shape = answer.querySelector('[data-slot=outcome-shape]')?.getAttribute('data-state')
  const number = answer.querySelector('[data-slot=number-plate]')?.textContent
  return { answer: within(answer), shape, number }
}

test('[P1 P4] a sticker scanned with no network reads PASSED, with the shape, the number, and all there is to compare', async () => {
  const pit = await aPitExit()
  pit.goOffline()
  pit.open()

  camera.shows(pit.qrText)

  const { answer, shape, number } = await theAnswer('PASSED')
  expect([shape, number]).toEqual(['ok', '47'])
  expect(answer.getByText('…11KLM · blue')).toBeInTheDocument()
  expect(answer.getByText('Tarn 2')).toBeInTheDocument()
  expect(answer.getByText('Driver 1 (band 118) may drive')).toBeInTheDocument()
})

test('[P3] a list that is too old reads CHECK, with how old, what to ask on the radio, and the number', async () => {
  const pit = await aPitExit()
  pit.later(31)
  pit.open()

  camera.shows(pit.qrText)

  const { answer, shape, number } = await theAnswer('CHECK')
  expect([shape, number]).toEqual(['ask', '47'])
  expect(answer.getByText(/31 min old/)).toBeInTheDocument()
  expect(answer.getByText(/Ask on the radio/)).toBeInTheDocument()
})

test('[P2] a number without a pass reads HOLD, with the shape, the number and where to send it', async () => {
  const pit = await aPitExit()
  pit.open()

  await pit.keyIn('48')
  await pit.press('Ask')

  const { answer, shape, number } = await theAnswer('HOLD')
  expect([shape, number]).toEqual(['fail', '48'])
  expect(answer.getByText('Send the car to the bay.')).toBeInTheDocument()
})

test('[P7] the code under the sticker finds its pass; one with two signs swapped is told before it is asked', async () => {
  const pit = await aPitExit()
  pit.open()
  const swapped = pit.typedCode.replace(/(.)(?!\1)(.)/, '$2$1')
  await userEvent.click(screen.getByRole('tab', { name: 'Code' }))

  await userEvent.type(screen.getByLabelText('Code under the sticker'), swapped)
  expect(screen.getByText('A sign is wrong, or two are swapped.')).toBeInTheDocument()

  await userEvent.clear(screen.getByLabelText('Code under the sticker'))
  await userEvent.type(screen.getByLabelText('Code under the sticker'), pit.typedCode)
  await pit.press('Ask')

  expect((await theAnswer('PASSED')).number).toBe('47')
})

test.each([
  ['a link', 'https://example.org/login?next=1'],
  ['a script', 'javascript:document.title="taken"'],
  ['markup', '<a href="https://example.org">47</a><img src=x onerror=alert(1)>'],
  ['words', 'PASSED 47'],
])('[P2] %s in a foreign code reads HOLD: it is no link, is shown nowhere, kept nowhere and leads nowhere', async (_what, text) => {
  const pit = await aPitExit()
  const opened = vi.spyOn(window, 'open')
  const asked = vi.spyOn(globalThis, 'fetch')
  pit.open()
  const before = window.location.href

  camera.shows(text)

  const { shape } = await theAnswer('HOLD')
  expect(shape).toBe('fail')
  expect(screen.queryAllByRole('link')).toEqual([])
  expect(document.body.innerHTML).not.toContain(text)
  expect(document.body.textContent).not.toContain('example.org')
  const kept = () =>
    JSON.stringify(Array.from({ length: localStorage.length }, (_, index) => localStorage.getItem(localStorage.key(index) ?? '')))
  // The scan is kept a moment after its answer stands.
  await waitFor(() => expect(kept()).toContain('foreign-code'))
  for (const word of text.match(/\w{6,}/g) ?? []) expect(kept()).not.toContain(word)
  expect(window.location.href).toBe(before)
  expect([opened.mock.calls, asked.mock.calls]).toEqual([[], []])
})

test('[P3] the marshal says which group runs, and that is kept over a reload', async () => {
  const pit = await aPitExit()
  pit.open()
  await pit.press('Which group is running?')
  await pit.press('A')

  expect(screen.getByRole('button', { name: 'A running' })).toBeInTheDocument()

  cleanup()
  pit.open()
  expect(await screen.findByRole('button', { name: 'A running' })).toBeInTheDocument()
})

test('[P8] where some may not drive, the marshal taps who is aboard: the banded one may go, the other is HOLD', async () => {
  const pit = await aPitExit({ coDriver: true })
  pit.open()
  camera.shows(pit.qrText)
  const check = await theAnswer('CHECK')
  expect(check.answer.getByText('Rhea Birkett may not: no band yet')).toBeInTheDocument()

  await pit.press('Driver 1 (band 118)')
  await pit.press('That is all aboard')
  expect(await screen.findByText('PASSED')).toBeInTheDocument()

  await pit.press(/^Rhea Birkett/)
  await pit.press('That is all aboard')
  expect(await screen.findByText('HOLD')).toBeInTheDocument()
})

test('[P8] somebody aboard who is not named for the car is HOLD', async () => {
  const pit = await aPitExit({ coDriver: true })
  pit.open()
  camera.shows(pit.qrText)

  await pit.press('Driver 1 (band 118)')
  await pit.press('Somebody else, or no band on the wrist')
  await pit.press('That is all aboard')

  expect((await theAnswer('HOLD')).answer.getByText('Somebody is aboard who is not named for this car.')).toBeInTheDocument()
})

test('while an answer stands the camera is not listened to; the next car is', async () => {
  const pit = await aPitExit()
  pit.open()
  camera.shows('something else')
  await theAnswer('HOLD')

  camera.shows(pit.qrText)
  expect(screen.queryByText('PASSED')).toBeNull()

  await pit.press('Next car')
  camera.shows(pit.qrText)
  expect(await screen.findByText('PASSED')).toBeInTheDocument()
})

test('without a camera the screen says why in words, and numbers still work', async () => {
  const pit = await aPitExit()
  pit.open()

  act(() => camera.fails(scanProblem('refused')))

  expect(screen.getByText(/told not to let this page use the camera/)).toBeInTheDocument()
  await pit.keyIn('47')
  await pit.press('Ask')
  expect(await screen.findByText('PASSED')).toBeInTheDocument()
})
