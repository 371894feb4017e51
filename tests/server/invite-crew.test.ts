import { afterEach, beforeEach, expect, test } from 'vitest'
import * as tables from '@/db/schema'
import { choosePassword } from '@/lib/accounts/commands/choose-password'
import { inviteCrew } from '@/lib/crew/commands/invite-crew'
import type { AccountActor } from '@/lib/platform/actor'
import { newId } from '@/lib/platform/ids'
import { isRefusal } from '@/lib/platform/refusal'
import { isRightPassword } from '@/lib/platform/password'
import { startSession } from '@/lib/platform/session'
import { aClub } from '../support/a-club'
import { freshDatabase } from '../support/fresh-database'

const NOW = Date.UTC(2026, 4, 2)
const DAY = 86_400_000
const NOBODY = { kind: 'nobody' } as const

let fresh: ReturnType<typeof freshDatabase>
let actor: AccountActor
let event: string
let club: Awaited<ReturnType<typeof aClub>>
beforeEach(async () => {
  fresh = freshDatabase()
  club = await aClub(fresh.database)
  event = club.addEvent()
  actor = { kind: 'account', accountId: newId(), clubId: club.clubId, name: 'Dorian Marsh', clubRoles: ['organiser'], signInHash: '' }
})
afterEach(() => fresh.close())

const deps = (now = NOW) => ({ database: fresh.database, now, origin: 'https://bay.example' }) as never
const invite = (role: 'chief' | 'scrutineer', email = 'Sella@Example.org', by = actor) =>
  inviteCrew({ params: { event }, query: {}, body: { name: 'Sella Warrick', email, role } }, by, deps())
const choose = (token: string, password: string, now = NOW) =>
  choosePassword({ params: { token }, query: {}, body: { password } }, NOBODY, deps(now))

function mails() {
  return fresh.database.select().from(tables.mailOutbox).all()
}
function tokenOf(text: string): string {
  return /\/password\/(\S+)/.exec(text)?.[1] ?? ''
}
function invited() {
  const row = fresh.database
    .select()
    .from(tables.account)
    .all()
    .find(({ email }) => email === 'sella@example.org')
  if (!row) throw new Error('there is no account')
  return row
}

test('somebody new is crew at once, signs in with nothing, and chooses a password by the link of the mail', async () => {
  expect(await invite('chief')).toEqual({ isNew: true, isAdded: true })
  expect(fresh.database.select().from(tables.crewMember).all()).toMatchObject([{ role: 'chief', state: 'accepted' }])
  const [mail] = mails()
  expect(mail).toMatchObject({ kind: 'crew-invitation', to: 'sella@example.org' })
  await startSession(fresh.database, invited().id, 'another browser')

  const token = tokenOf(mail?.text ?? '')
  expect(token).toHaveLength(27)
  expect(await choose(token, 'seven drilled bolts')).toEqual({ email: 'sella@example.org' })
  expect(await isRightPassword(invited().passwordHash, 'seven drilled bolts')).toBe(true)
  expect(fresh.database.select().from(tables.signIn).all()).toEqual([])
})

test('the link opens once, for seven days, and for nobody without it', async () => {
  await invite('chief')
  const token = tokenOf(mails()[0]?.text ?? '')
  expect(await choose('A'.repeat(27), 'seven drilled bolts')).toMatchObject({ code: 'missing' })
  expect(await choose(token, 'seven drilled bolts', NOW + 7 * DAY)).toMatchObject({ code: 'missing' })
  expect(isRefusal(await choose(token, 'seven drilled bolts'))).toBe(false)
  expect(await choose(token, 'eight drilled bolts')).toMatchObject({ code: 'missing' })
  expect(await isRightPassword(invited().passwordHash, 'seven drilled bolts')).toBe(true)
})

test.each(['short', 'passwordpassword'])('the password %s is refused in words, and the link still opens', async (password) => {
  await invite('chief')
  const token = tokenOf(mails()[0]?.text ?? '')
  expect(await choose(token, password)).toMatchObject({ code: 'invalid', details: { issues: [{ path: 'password' }] } })
  expect(isRefusal(await choose(token, 'seven drilled bolts'))).toBe(false)
})

test('somebody with an account is told without a link to choose a password; the same role twice is one invitation', async () => {
  club.addAccount('entrant', 'sella@example.org')
  expect(await invite('scrutineer')).toEqual({ isNew: false, isAdded: true })
  expect(mails()[0]?.text).not.toContain('/password/')
  expect(await invite('scrutineer')).toEqual({ isNew: false, isAdded: false })
  expect(mails()).toHaveLength(1)
  expect(fresh.database.select().from(tables.crewMember).all()).toHaveLength(1)
})

test('a role that had ended stands again when an organiser says so', async () => {
  await invite('scrutineer')
  fresh.database.update(tables.crewMember).set({ state: 'ended' }).run()
  expect(await invite('scrutineer')).toEqual({ isNew: false, isAdded: true })
  expect(fresh.database.select().from(tables.crewMember).all()).toMatchObject([{ state: 'accepted' }])
})

test('another club’s event is as one that never was', async () => {
  expect(await invite('chief', 'x@example.org', { ...actor, clubId: newId() })).toMatchObject({ code: 'missing' })
  expect(fresh.database.select().from(tables.account).all()).toEqual([])
})
