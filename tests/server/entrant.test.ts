import { eq } from 'drizzle-orm'
import { afterEach, beforeEach, describe, expect, test } from 'vitest'
import { account, car, declaration, declarationDraft, entryPerson, event, kit, person, signIn } from '@/db/schema'
import { NOTHING_DECLARED } from '@/lib/contracts/declaration'
import { openEntryLink } from '@/lib/contracts/entry-link'
import { saveDraft, signDeclaration } from '@/lib/contracts/my-declaration'
import { myEntry, type MyEntry } from '@/lib/contracts/my-entry'
import { addKit, keepCar, keepKit } from '@/lib/contracts/my-garage'
import { addMyKit, keepMyCar, keepMyKit } from '@/lib/entrants/commands/keep-garage'
import { openLink } from '@/lib/entrants/commands/open-entry-link'
import { saveDeclarationDraft } from '@/lib/entrants/commands/save-declaration-draft'
import { signDeclaration as sign } from '@/lib/entrants/commands/sign-declaration'
import { declaringOf } from '@/lib/entrants/queries/declaring-of'
import { describeEntryLink } from '@/lib/entrants/queries/find-entry-link'
import { myCars, myEntries, myKit } from '@/lib/entrants/queries/my-garage'
import { preChecksOf } from '@/lib/entrants/queries/pre-checks-of'
import { seeMyEntry } from '@/lib/entrants/queries/see-my-entry'
import { handle } from '@/lib/http/server'
import { resetAllowances } from '@/lib/http/rate'
import { setClock } from '@/lib/platform/clock'
import { makeEntryLink, revokeEntryLinks, revokeLinksOfOldAddress } from '@/lib/platform/make-entry-link'
import { isRefusal } from '@/lib/platform/refusal'
import { startSession } from '@/lib/platform/session'
import { daySnapshotOf } from '@/lib/sync/server/day-snapshot-of'
import { dayReading } from '@/lib/sync/server/day-reading'
import { eventFrame } from '@/lib/sync/server/event-frame'
import { eventLog } from '@/lib/sync/server/event-log'
import { pinnedBook } from '@/lib/sync/server/pinned-books'
import { actorOf, anEntry, SATURDAY } from '../support/an-entrant'
import { ask } from '../support/ask'
import { freshDatabase } from '../support/fresh-database'

const DAY_MS = 86_400_000
const HARNESS = { belts: 'harness', headRestraint: false, roof: 'closed' } as const
const label = (labelYear: number) => ({
  ...NOTHING_DECLARED,
  facts: HARNESS,
  answers: { 'harness.label': { standard: 'fia-8853-2016', labelYear, labelsComplete: 'yes', labelsSameNumber: 'yes' } },
})

let fresh: ReturnType<typeof freshDatabase>
let own: Awaited<ReturnType<typeof anEntry>>
let at = SATURDAY
let backToNow: () => void
beforeEach(async () => {
  fresh = freshDatabase()
  resetAllowances()
  at = SATURDAY
  backToNow = setClock(() => at)
  own = await anEntry(fresh.database)
})
afterEach(() => {
  backToNow()
  fresh.close()
})

const opens = (token: string, cookie = '') =>
  ask(handle(openEntryLink, openLink), { method: 'POST', params: { token }, body: {}, ...(cookie ? { cookie } : {}) })

/** Somebody who came by a link of their own. */
async function ida(): Promise<string> {
  return (await opens(own.link.token)).cookie
}

async function signedIn(email: string): Promise<string> {
  return (await startSession(fresh.database, actorOf(fresh.database, email).accountId, '')).split(';')[0] ?? ''
}

/** Somebody of the same list who sits in another car. */
async function anotherEntrant(): Promise<string> {
  const other = await anEntry(fresh.database, 5)
  fresh.database.update(person).set({ email: 'bo.lind@example.org', accountId: null }).where(eq(person.id, other.person.id)).run()
  return (await opens(other.link.token)).cookie
}

const sees = async (cookie: string, entry = own.row.id) =>
  ask<MyEntry & { code: string }>(handle(myEntry, seeMyEntry(dayReading)), { params: { entry }, cookie })
const signs = (cookie: string, parts: unknown, entry = own.row.id, name = 'Ida Rook') =>
  ask<{ version: number; code: string }>(handle(signDeclaration, sign(dayReading)), { method: 'POST', params: { entry }, cookie, body: { parts, name, agrees: true } }) // prettier-ignore
const drafts = (cookie: string, parts: unknown, entry = own.row.id) =>
  ask(handle(saveDraft, saveDeclarationDraft(dayReading)), { method: 'PUT', params: { entry }, cookie, body: { parts } })

describe('the link from an entry', () => {
  test('looking at it changes nothing: a mail scanner does not use it up', () => {
    const before = fresh.database.select().from(account).all().length
    const shown = [1, 2, 3].map(() => describeEntryLink(fresh.database, own.link.token, null, at))

    expect(shown[2]).toMatchObject({ is: 'open', number: own.row.number, name: 'Ida Rook', somebodyElse: null })
    expect(fresh.database.select().from(account).all()).toHaveLength(before)
    expect(fresh.database.select().from(signIn).all()).toEqual([])
  })

  test('going on signs in the person it was sent to, as an entrant, and leads to the entry', async () => {
    const opened = await opens(own.link.token)

    expect([opened.status, opened.json]).toEqual([200, { entry: own.row.id }])
    expect(actorOf(fresh.database, 'ida.rook@example.org')).toMatchObject({ name: 'Ida Rook', clubRoles: ['entrant'] })
    expect((await sees(opened.cookie)).json).toMatchObject({ number: own.row.number, mayDeclare: true })
  })

  test('used again, as on the phone the next morning, it is the same account', async () => {
    const first = await ida()
    await opens(own.link.token)

    expect(fresh.database.select().from(account).where(eq(account.email, 'ida.rook@example.org')).all()).toHaveLength(1)
    expect((await sees(first)).status).toBe(200)
  })

  test.each([
    ['late', () => (at = own.link.expiresAt)],
    ['revoked', () => revokeEntryLinks(fresh.database, own.row.id, own.person.id, at)],
  ])('%s, it opens nothing and says what to do', async (_, spoil) => {
    spoil()
    const answer = await opens(own.link.token)

    expect([answer.status, answer.json.code]).toEqual([410, 'entry-link-over'])
    expect(answer.json.todo).toContain('Ask the organiser for a new link')
    expect(describeEntryLink(fresh.database, own.link.token, null, at)).toEqual({ is: 'over' })
    expect(fresh.database.select().from(signIn).all()).toEqual([])
  })

  test('it holds until seven days after the event, and an invented one not at all', async () => {
    expect(own.link.expiresAt).toBeGreaterThanOrEqual(Date.parse('2026-05-18T00:00:00Z'))
    expect(own.link.expiresAt).toBeLessThan(Date.parse('2026-05-19T00:00:00Z'))
    expect((await opens('A'.repeat(43))).json.code).toBe('entry-link-over')
  })

  test.each(['organiser@marram.example', 'scrutineer@marram.example'])(
    '%s is never signed in by a link: it may do more than an entrant',
    async (email) => {
      // prettier-ignore
      fresh.database.update(person).set({ email }).where(eq(person.id, own.person.id)).run()

      expect((await opens(own.link.token)).json.code).toBe('entry-link-needs-password')
      expect(fresh.database.select().from(signIn).all()).toEqual([])
      expect((await opens(own.link.token, await signedIn(email))).json).toEqual({ entry: own.row.id })
      expect(actorOf(fresh.database, email).clubRoles).toContain('entrant')
    },
  )

  test('somebody else who is signed in is told so beforehand, and is signed out by going on', async () => {
    const other = await anotherEntrant()
    const shown = describeEntryLink(fresh.database, own.link.token, actorOf(fresh.database, 'bo.lind@example.org'), at)
    expect(shown).toMatchObject({ somebodyElse: 'Ida Rook' })

    const opened = await opens(own.link.token, other)
    expect((await sees(opened.cookie)).status).toBe(200)
    expect((await sees(other)).json.code).toBe('not-signed-in')
  })

  test('an address that is corrected takes the entry from whoever had it, and the link that went to the old one opens nothing', async () => {
    const wrong = await ida()
    revokeLinksOfOldAddress(fresh.database, own.person.id, 'ida.rook@right.example', at)
    fresh.database.update(person).set({ email: 'ida.rook@right.example' }).where(eq(person.id, own.person.id)).run()

    expect((await sees(wrong)).json.code).toBe('missing')
    expect(myEntries(fresh.database, actorOf(fresh.database, 'ida.rook@example.org'))).toEqual([])
    expect((await opens(own.link.token)).json.code).toBe('entry-link-over')
    const right = makeEntryLink(fresh.database, own.row, own.person, at)
    expect((await sees((await opens(right.token)).cookie)).status).toBe(200)
  })

  test('who is taken out of the entry has no way into it', async () => {
    fresh.database.delete(entryPerson).where(eq(entryPerson.personId, own.person.id)).run()
    expect((await opens(own.link.token)).json.code).toBe('entry-link-over')
  })

  test('the same address written otherwise takes nothing back', async () => {
    revokeLinksOfOldAddress(fresh.database, own.person.id, ' IDA.ROOK@example.org', at)
    expect((await opens(own.link.token)).status).toBe(200)
  })

  test('an entry without an address is no way in', async () => {
    fresh.database.update(person).set({ email: null }).where(eq(person.id, own.person.id)).run()
    expect((await opens(own.link.token)).json.code).toBe('entry-link-no-address')
  })
})

describe('a declaration', () => {
  test('half filled it is kept and comes back, and only to whoever began it', async () => {
    const cookie = await ida()
    await drafts(cookie, label(2024))

    const back = declaringOf(dayReading, fresh.database, actorOf(fresh.database, 'ida.rook@example.org'), own.row.id, at)
    if (isRefusal(back)) throw new Error(back.code)
    expect([back.from, back.start.facts, back.start.answers]).toEqual(['draft', HARNESS, label(2024).answers])
    expect((await sees(cookie)).json.declaration).toMatchObject({ state: 'draft', version: null })
    expect(fresh.database.select().from(declaration).all()).toEqual([])
  })

  test('a label that has run out would not be passed: with figure, limit, source, and what to bring', async () => {
    const cookie = await ida()
    await signs(cookie, label(2024))

    const { json } = await sees(cookie)
    expect([json.declaration.state, json.preCheck.says, json.verdict]).toEqual(['signed', 'would not be passed', 'declared only'])
    expect(json.mend[0]).toMatchObject({ weight: 'fail', place: 'Cabin', bring: expect.stringContaining('in date') as string })
    expect(json.mend[0]?.words).toContain('last valid day Tue 31 December 2024')
    expect(json.mend[0]?.source.length).toBeGreaterThan(0)
  })

  test('nothing declared is never passed: what was not said reads not answered', async () => {
    const cookie = await ida()
    await signs(cookie, NOTHING_DECLARED)

    expect((await sees(cookie)).json).toMatchObject({ preCheck: { says: 'not answered', answered: 0 }, verdict: 'declared only' })
  })

  test('signed again it is a new version; the very same again is not', async () => {
    const cookie = await ida()
    const versions = [await signs(cookie, label(2024)), await signs(cookie, label(2024)), await signs(cookie, label(2027))]

    expect(versions.map(({ json }) => json.version)).toEqual([1, 1, 2])
    expect(fresh.database.select().from(declaration).all()).toHaveLength(2)
    expect(fresh.database.select().from(declarationDraft).all()).toEqual([])
    expect((await sees(cookie)).json.mend).toEqual([])
  })

  test('the bay gets it with its next pull: facts nobody knew, values by check, and when it was signed', async () => {
    const cookie = await ida()
    const before = fresh.database.select().from(event).get()!.snapshotVersion
    await signs(cookie, { ...label(2027), answers: { ...label(2027).answers, 'tyres.date-code.rear-left': { dateCode: '24 W19' } } })

    const frame = eventFrame(fresh.database, own.eventId)!
    expect(frame.event.snapshotVersion).toBe(before + 1)
    const snapshot = daySnapshotOf(fresh.database, frame, eventLog(fresh.database, own.eventId), 'https://marram.example')
    expect(snapshot.entries.find(({ id }) => id === own.row.id)).toMatchObject({
      facts: HARNESS,
      declaration: { version: 1 },
      declaredAt: at,
      declared: { 'harness.label': { labelYear: 2027 }, 'tyres.date-code.rear-left': { dateCode: '24 W19' } },
    })
  })

  test('the car becomes its driver’s, and what stays as it is is kept for next time; what wears is not', async () => {
    const cookie = await ida()
    await signs(cookie, { ...label(2027), answers: { ...label(2027).answers, 'tyres.tread.rear-left': { leastMm: 5.5, innerEdgeMm: 5 } } })

    const [mine] = myCars(fresh.database, actorOf(fresh.database, 'ida.rook@example.org'))
    expect(mine?.facts).toMatchObject({ belts: 'harness', 'harness.label/labelYear': 2027 })
    expect(JSON.stringify(mine?.facts)).not.toContain('tyres.tread')
  })

  test('what the checklist does not know, or what cannot be, is not kept in it', async () => {
    const cookie = await ida()
    const stranger = `helmet.label@${fresh.database.select().from(entryPerson).all()[9]!.personId}`
    await signs(cookie, {
      ...NOTHING_DECLARED,
      facts: { belts: 'string', wings: true },
      answers: { 'harness.label': { labelYear: 1066, standard: 'none' }, 'no.such': { x: 1 }, [stranger]: { impact: 'no' } },
    })

    const [row] = fresh.database.select().from(declaration).all()
    expect(row?.body).toMatchObject({ parts: { facts: {}, answers: {} } })
  })

  test('two who share a car declare each their own kit, and neither sees or loses the other’s', async () => {
    const cookie = await ida()
    const mine = `helmet.label@${own.person.id}`
    await signs(cookie, { ...label(2027), answers: { ...label(2027).answers, [mine]: { impact: 'no', label: 'snell-sa2020' } } })
    const second = await anEntry(fresh.database)
    fresh.database.update(person).set({ email: 'bo.lind@example.org', name: 'Bo Lind' }).where(eq(person.id, second.person.id)).run()
    const bo = (await opens(second.link.token)).cookie
    await signs(bo, { ...label(2027), answers: { ...label(2027).answers, [`helmet.label@${second.person.id}`]: { impact: 'yes' } } }, own.row.id, 'Bo Lind') // prettier-ignore

    const [row] = fresh.database.select().from(declaration).where(eq(declaration.version, 2)).all()
    expect(Object.keys((row?.body as { parts: { answers: object } }).parts.answers)).toContain(mine)
    expect(JSON.stringify((await sees(cookie)).json.mend)).not.toContain('Bo Lind')
    expect(JSON.stringify((await sees(bo)).json.mend)).toContain('Bo Lind')
  })

  test('after the event it is closed', async () => {
    const cookie = await ida()
    at = SATURDAY + 3 * DAY_MS
    const again = (await opens(own.link.token)).cookie || cookie

    expect((await signs(again, label(2027))).json.code).toBe('declaration-closed')
  })

  test('the organiser sees who has not declared and what would not be passed', async () => {
    const cookie = await ida()
    await signs(cookie, label(2024))

    const held = fresh.database.select().from(event).get()!
    const rows = preChecksOf(fresh.database, held, pinnedBook(fresh.database, held.checklistHash, held.limitsHash)!)
    expect(rows).toHaveLength(142)
    expect(rows.filter(({ version }) => version !== null)).toMatchObject([{ entry: own.row.id, says: 'would not be passed', worries: [{ weight: 'fail' }] }]) // prettier-ignore
    expect(rows.filter(({ says }) => says === 'would be passed')).toEqual([])
  })
})

describe('what is somebody else’s answers as missing', () => {
  test('entry, declaration, car and kit, with nothing of it in the answer', async () => {
    const cookie = await ida()
    await signs(cookie, label(2024))
    await ask(handle(addKit, addMyKit), { method: 'POST', cookie, body: { kind: 'helmet', name: 'canary helmet', values: {}, photoHash: null, retired: false } }) // prettier-ignore
    const [piece] = fresh.database.select().from(kit).all()
    const [mine] = fresh.database.select().from(car).where(eq(car.id, own.row.carId)).all()
    const other = await anotherEntrant()

    const kept = { kind: 'helmet', name: 'taken', values: {}, photoHash: null, retired: true } as const
    const answers = [
      await sees(other),
      await drafts(other, label(2027)),
      await signs(other, label(2027)),
      await ask(handle(keepCar, keepMyCar), { method: 'PUT', params: { car: mine!.id }, cookie: other, body: { facts: {} } }),
      await ask(handle(keepKit, keepMyKit), { method: 'PUT', params: { kit: piece!.id }, cookie: other, body: kept }),
    ]
    expect(answers.map(({ status, json }) => [status, json.code])).toEqual(answers.map(() => [404, 'missing']))
    expect(JSON.stringify(answers.map(({ json }) => json))).not.toMatch(/canary|8853|Ida/)
    expect(myKit(fresh.database, actorOf(fresh.database, 'bo.lind@example.org'))).toEqual([])
    expect(fresh.database.select().from(kit).all()).toEqual([piece])
  })

  test('a passenger sees the entry and declares nothing', async () => {
    const cookie = await ida()
    fresh.database.update(entryPerson).set({ role: 'passenger' }).where(eq(entryPerson.personId, own.person.id)).run()

    expect((await sees(cookie)).json).toMatchObject({ number: own.row.number, mayDeclare: false })
    expect((await signs(cookie, label(2027))).json.code).toBe('forbidden')
  })
})
