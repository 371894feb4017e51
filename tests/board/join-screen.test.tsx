import { cleanup, fireEvent, render, screen } from '@testing-library/react'
import { SWRConfig } from 'swr'
import { afterEach, beforeEach, expect, test, vi } from 'vitest'
import { readClaims } from '@/app/_crew/read-claims'
import { JoinScreen } from '@/app/(public)/join/[token]/_join/join-screen'
import { answering } from './answers'

const TOKEN = 'rFFDMSo-Yw4Afj0zB3Qey0KOlyM'
const event = { id: 'e1', name: 'Marram at the Ottermere Ring', venue: 'Ottermere Ring', firstDay: '2026-05-09', lastDay: '2026-05-10' }
const code = { event, role: 'marshal', expiresAt: 1 }
const joined = { claim: 'bv5xk9b2waMnxDECOoHg8z5HoQI', member: 'm', person: 'p', role: 'marshal', event }
const waiting = { state: 'waiting', name: 'Ines Calder', person: 'p', role: 'marshal', event }

beforeEach(() => window.localStorage.clear())
afterEach(() => {
  cleanup()
  vi.unstubAllGlobals()
})

function open() {
  render(
    <SWRConfig value={{ provider: () => new Map() }}>
      <JoinScreen token={TOKEN} />
    </SWRConfig>,
  )
}

async function askToJoin() {
  open()
  fireEvent.change(await screen.findByLabelText('Your name'), { target: { value: 'Ines Calder' } })
  fireEvent.click(screen.getByRole('button', { name: 'Ask to join' }))
  await screen.findByText('Ines Calder is waiting to be accepted as marshal')
}

test('the code says event and role; asking keeps the claim where the crew’s screens read it', async () => {
  answering({ ok: code }, { ok: joined }, { ok: waiting })
  await askToJoin()

  expect(readClaims(window.localStorage)).toEqual([
    { claim: joined.claim, event: 'e1', role: 'marshal', name: 'Ines Calder', title: 'Marram at the Ottermere Ring, Sat 9 May 2026' },
  ])
})

test('after a reload the phone goes on waiting and does not ask twice; accepted it leads to its post', async () => {
  answering({ ok: code }, { ok: joined }, { ok: waiting })
  await askToJoin()
  cleanup()

  const asked = answering({ ok: { ...waiting, state: 'accepted' } })
  open()

  expect(await screen.findByRole('link', { name: 'To the pit exit' })).toHaveAttribute('href', '/pit-exit')
  expect(asked.map(({ url }) => url)).toEqual(['/api/join/state'])
})

test.each([
  ['join-code-expired', 410, 'This join code has run out.'],
  ['join-code-unknown', 404, 'This join code is not known.'],
  ['missing', 404, 'This join code is not known.'],
] as const)('a code that is %s is told in words', async (problem, status, words) => {
  answering({ problem: { status, code: problem, what: words, kept: 'Nothing was changed.', todo: 'Ask for a new one.' } })
  open()

  expect(await screen.findByRole('alert')).toHaveTextContent(words)
})
