import { screen, waitFor, within } from '@testing-library/react'
import { expect, test } from 'vitest'
import { aDesk, type Desk } from './a-desk'

const personOf = (desk: Desk, index: number) => `person:${desk.drivers[index] as string}`
const standing = (desk: Desk, index: number, check: string) => desk.phone.day.state(personOf(desk, index)).checks.get(check)?.standing
const saysNotYet = async () => (await screen.findByText('No band yet.')).parentElement

/** Closes the two places of a person, each with its one sentence: the papers, then the helmet. */
async function seesAllPlaces(desk: Desk): Promise<void> {
  await desk.press(/^Go on:/)
  await desk.press(/licence.*seen, nothing found$|helmet.*seen, nothing found$/)
  await waitFor(() => expect(desk.phone.day.state(personOf(desk, 0)).open.length).toBeLessThan(4))
  await desk.press(/seen, nothing found$/)
}

test('nothing typed shows who is missing by group with counts, and a number shows everybody of that car', async () => {
  const desk = await aDesk()
  desk.open()
  expect(screen.getByText(/0 of 3 banded, 3 missing/)).toBeVisible()
  await desk.user.type(screen.getByLabelText('Name, car number or plate'), '48')
  const found = screen.getAllByRole('listitem')
  expect(found).toHaveLength(1)
  expect(found[0]).toHaveTextContent('Driver 2')
})

test('one press says for all who are ticked that they were at the briefing of the timetable, and undo takes all of it back', async () => {
  const desk = await aDesk({ briefings: [8 * 60 + 15, 9 * 60] })
  desk.open('/sign-on/briefing')
  expect(screen.getByRole('button', { name: 'Tick who was there' })).toBeDisabled()
  await desk.press('Tick all of A')
  expect(screen.getByRole('button', { name: 'Say which briefing' })).toBeDisabled()
  await desk.user.click(screen.getByRole('radio', { name: '08:15' }))
  await desk.user.click(screen.getByRole('checkbox', { name: /Driver 3/ }))
  await desk.press('2 at the 08:15 briefing')
  await screen.findByText('Saved: 2 people were at the 08:15 briefing')
  expect([0, 1, 2].map((index) => standing(desk, index, 'papers.briefing'))).toEqual(['ok', 'ok', undefined])
  const said = desk.phone.day.log(personOf(desk, 0)).at(-1)?.record
  expect(said).toMatchObject({ kind: 'finding', notes: [expect.any(String)] })
  expect(desk.phone.day.note((said as { notes: string[] }).notes[0] as string)).toBe('At the 08:15 briefing')

  await desk.press('Undo')
  await waitFor(() => expect(standing(desk, 0, 'papers.briefing')).toBe('not-seen'))
  expect(standing(desk, 1, 'papers.briefing')).toBe('not-seen')
})

test('without a briefing in the timetable its time is typed, and who was there is not ticked twice', async () => {
  const desk = await aDesk()
  desk.open('/sign-on/briefing')
  await desk.user.click(screen.getByRole('checkbox', { name: /Driver 1/ }))
  await desk.user.type(screen.getByLabelText('Time of the briefing'), '08:40')
  await desk.press('1 at the 08:40 briefing')
  await screen.findByText('Saved: 1 person was at the 08:40 briefing')
  expect(screen.getByRole('checkbox', { name: /Driver 1.*was there/ })).toBeDisabled()
})

test('there is no way to a band before everything required is seen, and it is said what is missing; then the band is issued with its number', async () => {
  const desk = await aDesk()
  desk.open(`/sign-on/person/${desk.drivers[0] as string}`)
  await desk.user.click(screen.getByRole('radio', { name: 'No' }))
  await desk.press('Begin')
  expect(await saysNotYet()).toHaveTextContent('Still to be in order: helmet.label, licence, indemnity, briefing.')
  expect(screen.queryByLabelText('Number on the band you put on')).toBeNull()
  await seesAllPlaces(desk)
  await desk.user.type(await screen.findByLabelText('Number on the band you put on'), '417')
  await desk.press('Band is on')
  const panel = await screen.findByRole('region', { name: 'Band' })
  await within(panel).findByText(/Band 417/)
  expect(within(panel).getByText(/^Its code:/)).toBeVisible()
})

test('a minor is offered as one, and gets no band without the consent', async () => {
  const desk = await aDesk({ hasMinor: true })
  desk.open(`/sign-on/person/${desk.drivers[0] as string}`)
  expect(screen.getByText('Under age', { selector: 'p' })).toBeVisible()
  expect(screen.getByRole('radio', { name: 'Yes' })).toBeChecked()
  await desk.press('Begin')
  expect(await saysNotYet()).toHaveTextContent('consent')
})

test('a band number on somebody else’s wrist is refused in words with their name, and what was typed stays', async () => {
  const desk = await aDesk()
  const [first, second] = desk.drivers as [string, string]
  for (const person of [first, second]) await passes(desk, person)
  await desk.phone.day.issueBand({ person: first, bandNumber: '12' })
  desk.open(`/sign-on/person/${second}`)
  await desk.user.type(await screen.findByLabelText('Number on the band you put on'), '12')
  await desk.press('Band is on')
  expect(await screen.findByText('Band 12 was given to Driver 1 today.')).toBeVisible()
  expect(screen.getByLabelText('Number on the band you put on')).toHaveValue('12')
})

test('somebody on no list is put into a car, is there at once, and is walked next; a name that is known is asked about', async () => {
  const desk = await aDesk()
  desk.open('/sign-on/turned-up')
  const submit = () => screen.getByRole('button', { name: /^Put into/ })
  expect(submit()).toBeDisabled()
  await desk.user.type(screen.getByLabelText('First and last name'), 'Driver 2')
  expect(screen.getByText(/whether it is somebody known/)).toBeVisible()
  await desk.user.clear(screen.getByLabelText('First and last name'))
  await desk.user.type(screen.getByLabelText('First and last name'), 'Lio Brandt')
  await desk.user.click(screen.getByRole('radio', { name: 'Passenger' }))
  await desk.user.click(screen.getByRole('radio', { name: 'No' }))
  await desk.user.type(screen.getByLabelText('Car number or plate'), '47{Enter}')
  await desk.user.click(submit())
  expect(await screen.findByRole('heading', { level: 1, name: 'Lio Brandt' })).toBeVisible()
  expect(screen.getByText(/Tarn 2 \(passenger\)/)).toBeVisible()
})

test('a scrutineer signs people on, and is told who puts somebody into a car', async () => {
  const desk = await aDesk({ roles: ['scrutineer'] })
  desk.open('/sign-on/turned-up')
  expect(screen.getByText('Whoever is unlocked here may not put anybody into a car.')).toBeVisible()
})

test('an address that leads to nobody says so and leads back', async () => {
  const desk = await aDesk()
  desk.open('/sign-on/person/nobody')
  await desk.press('Find a person')
  expect(screen.getByRole('heading', { level: 1, name: 'Sign-on' })).toBeVisible()
})

async function passes({ phone }: Desk, person: string): Promise<void> {
  const event = phone.day.snapshot()?.event
  const pins = { checklist: event?.checklistHash ?? '', limits: event?.limitsHash ?? '', declaration: null }
  await phone.day.record([{ kind: 'presented', subject: { person }, ...pins, facts: { minor: false }, depth: 'standard' }])
  const { open } = phone.day.state(`person:${person}`)
  await phone.day.record(open.map((check) => ({ kind: 'finding', subject: { person }, check, outcome: 'ok' }) as const))
}
