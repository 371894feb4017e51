import { cleanup, render, screen, waitFor } from '@testing-library/react'
import userEvent from '@testing-library/user-event'
import { SWRConfig } from 'swr'
import { afterEach, beforeEach, expect, test, vi } from 'vitest'
import { MailScreen } from '@/app/(organiser)/events/[event]/mail/_mail/mail-screen'
import type { EventMail, MailView } from '@/lib/contracts/mail'
import { answering } from '../board/answers'

beforeEach(() => {
  // jsdom has no modal dialogs; what is asked here is what stands inside.
  HTMLDialogElement.prototype.showModal = function showModal() {
    this.open = true
  }
  HTMLDialogElement.prototype.close = function close() {
    this.open = false
  }
})
afterEach(() => {
  cleanup()
  vi.unstubAllGlobals()
})

const SEVEN_FORTY = Date.UTC(2026, 4, 9, 6, 40)
const mail: MailView = {
  id: 'm1',
  kind: 'invitation',
  number: '47',
  to: 'una@marram.example',
  subject: 'Declare your car',
  createdAt: 0,
  state: 'sent',
  tries: 1,
  nextTryAt: null,
  sentAt: SEVEN_FORTY,
  why: null,
}
const nothing = { invitations: 0, reminders: 0, 'would-not-be-passed': 0, results: 0 }
const seen = (given: Partial<EventMail> = {}) => ({
  ok: { sender: 'inbox', due: nothing, drivers: 3, withoutAddress: [], mails: [mail], ...given } satisfies EventMail,
})

function open(): void {
  render(
    <SWRConfig value={{ provider: () => new Map() }}>
      <MailScreen eventId="e" timeZone="Europe/London" />
    </SWRConfig>,
  )
}

test('the number of mails is said before anything is sent, and the number that was seen is what is asked for', async () => {
  const asked = answering(seen({ due: { ...nothing, invitations: 3 } }), { ok: { written: 3 } }, seen())
  open()
  await userEvent.click(await screen.findByRole('button', { name: 'Invite all not invited: 3 mails' }))
  expect(screen.getByRole('heading', { name: 'Send 3 mails?' })).toBeVisible()
  expect(asked).toHaveLength(1)

  await userEvent.click(screen.getByRole('button', { name: 'Send' }))
  expect(await screen.findByText('3 mails are on the way.')).toBeVisible()
  expect(asked[1]).toMatchObject({ method: 'POST', url: '/api/events/e/mail', body: { what: 'invitations', expected: 3 } })
  expect(await screen.findByText('Everybody with an address is invited.')).toBeVisible()
})

test('where there is nothing to send there is nothing to press, and the reason is said', async () => {
  answering(seen())
  open()
  expect(await screen.findByText('No car has a result that was not sent.')).toBeVisible()
  expect(screen.queryByRole('button', { name: /mails?$/ })).toBeNull()
})

test('a number that changed meanwhile is told, and nothing is taken for sent', async () => {
  const problem = {
    status: 409,
    code: 'mail-count-changed',
    what: 'Another number.',
    kept: 'Nothing was written.',
    todo: 'Look again.',
  } as const
  answering(seen({ due: { ...nothing, results: 1 } }), { problem }, seen({ due: { ...nothing, results: 2 } }))
  open()
  await userEvent.click(await screen.findByRole('button', { name: 'Send results: 1 mail' }))
  await userEvent.click(screen.getByRole('button', { name: 'Send' }))

  expect(await screen.findByText('Another number.')).toBeVisible()
  expect(screen.queryByText(/on the way/)).toBeNull()
})

test('what failed says why, when it is tried again or that it is not, and can be tried again now', async () => {
  const waits: MailView = { ...mail, id: 'm2', to: 'a@marram.example', state: 'waits', tries: 2, sentAt: null, nextTryAt: SEVEN_FORTY, why: 'The mail server asks to wait: 450 later' } // prettier-ignore
  const over: MailView = { ...waits, id: 'm3', to: 'b@marram.example', state: 'given-up', tries: 1, nextTryAt: null, why: 'The mail server will not take it: 550 no such person' } // prettier-ignore
  const asked = answering(seen({ mails: [over, waits, mail] }), { ok: { ...over, state: 'waits' } }, seen())
  open()
  expect(await screen.findByText('tried 2 times, again Sat 9 May 2026, 07:40')).toBeVisible()
  expect(screen.getByText('given up, tried once')).toBeVisible()
  expect(screen.getByText(/550 no such person/)).toBeVisible()
  expect(screen.getByText('sent Sat 9 May 2026, 07:40')).toBeVisible()

  await userEvent.click(screen.getByRole('button', { name: 'Try again: invitation to b@marram.example' }))
  await waitFor(() => expect(asked[1]).toMatchObject({ method: 'POST', url: '/api/events/e/mail/again', body: { mail: 'm3' } }))
})

test('without a mail server it is said that nothing leaves this machine, and where it can be read; with one it is not', async () => {
  answering(seen())
  open()
  expect(await screen.findByRole('link', { name: 'inbox' })).toHaveAttribute('href', '/inbox')
  cleanup()
  answering(seen({ sender: 'smtp' }))
  open()
  expect(await screen.findByText(/1 sent/)).toBeVisible()
  expect(screen.queryByText(/nothing leaves this machine/)).toBeNull()
})

test('drivers whom no mail can reach are named', async () => {
  answering(seen({ withoutAddress: [{ number: '48', name: 'Osk Brand' }] }))
  open()
  expect(await screen.findByText('1 of 3 drivers have no address: no mail reaches them')).toBeVisible()
  expect(screen.getByText('48 Osk Brand')).toBeInTheDocument()
})

test('no network: what was seen stays, and it is said', async () => {
  answering('no network')
  open()
  expect(await screen.findByText('The server could not be reached.')).toBeVisible()
  expect(screen.getByText('The mail is not here yet.')).toBeVisible()
})
