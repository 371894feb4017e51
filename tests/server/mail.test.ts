import { afterEach, beforeEach, describe, expect, test, vi } from 'vitest'
import { GET, POST } from '@/app/api/events/[event]/mail/route'
import { POST as AGAIN } from '@/app/api/events/[event]/mail/again/route'
import { audit, car, entry, entryLink, entryPerson, event as eventTable, mailOutbox, person, runGroup } from '@/db/schema'
import { transaction } from '@/db/transaction'
import type { EventMail, MailView } from '@/lib/contracts/mail'
import { resetAllowances } from '@/lib/http/rate'
import { sendDueMail } from '@/lib/mail/commands/send-due-mail'
import { writeWouldNotBePassed } from '@/lib/mail/commands/write-would-not-be-passed'
import { inboxMailSender } from '@/lib/mail/inbox-mail-sender'
import { startMailLoop } from '@/lib/mail/mail-loop'
import type { PreCheckRow } from '@/lib/mail/mail-readers'
import type { MailSender } from '@/lib/mail/port'
import { readInbox } from '@/lib/mail/queries/read-inbox'
import { smtpMailSender } from '@/lib/mail/smtp-mail-sender'
import { enqueueMail } from '@/lib/platform/enqueue-mail'
import { newId } from '@/lib/platform/ids'
import { startSession } from '@/lib/platform/session'
import { sha256 } from '@/lib/platform/sha256'
import { aClub, noSuchId } from '../support/a-club'
import { ask } from '../support/ask'
import { freshDatabase } from '../support/fresh-database'
import { aMailServer, aSilentServer, type MailServer } from '../support/mail-server'

const START = Date.parse('2026-05-01T09:00:00Z')
const HOUR = 3_600_000
let fresh: ReturnType<typeof freshDatabase>
let club: Awaited<ReturnType<typeof aClub>>
let event: string
let organiser: string
let server: MailServer

beforeEach(async () => {
  fresh = freshDatabase()
  resetAllowances()
  vi.useFakeTimers({ now: START, toFake: ['Date'] })
  club = await aClub(fresh.database)
  event = club.addEvent()
  organiser = (await startSession(fresh.database, club.addAccount('organiser', 'o@marram.example'), '')).split(';')[0] ?? ''
  server = await aMailServer({ disabledCommands: ['STARTTLS'] })
})
afterEach(async () => {
  vi.useRealTimers()
  fresh.close()
  await server.close()
})

const smtp = (url = server.url, given: { readonly allowPlain?: boolean; readonly patienceMs?: number } = {}): MailSender =>
  smtpMailSender({ url, from: 'Marram Track Days <office@marram.example>', allowPlain: true, patienceMs: 2_000, ...given })
const send = (sender: MailSender) => sendDueMail({ database: fresh.database, sender, now: Date.now, random: () => 0.5 })
const rows = () => fresh.database.select().from(mailOutbox).all()
const path = () => `/api/events/${event}/mail`
const params = () => ({ event })
const sees = async () => (await ask<EventMail>(GET, { path: path(), params: params(), cookie: organiser })).json
const writes = (what: string, expected: number) =>
  ask<{ written: number; code: string }>(POST, {
    method: 'POST',
    path: path(),
    params: params(),
    body: { what, expected },
    cookie: organiser,
  })
const triesAgain = (mail: string) =>
  ask<MailView & { code: string }>(AGAIN, { method: 'POST', path: `${path()}/again`, params: params(), body: { mail }, cookie: organiser })
const passes = (ms: number) => vi.setSystemTime(Date.now() + ms)

function aMail(to = 'idris@marram.example', sameAs: string = newId()): boolean {
  const text = { kind: 'invitation', to, subject: 'Declare your car', text: 'Hello.\n' } as const
  return transaction(fresh.database, (tx) =>
    enqueueMail(tx, { ...text, clubId: club.clubId, eventId: event, entryId: null, sameAs }, Date.now()),
  )
}

let cars = 0
function anEntry(number: string, email: string | null, of = event): { readonly entryId: string; readonly personId: string } {
  const { database } = fresh
  const { clubId } = club
  const [entryId, carId, groupId, personId] = [newId(), newId(), newId(), newId()]
  database.insert(car).values({ id: carId, clubId, model: 'Oriel GT4', colour: 'orange', plate: number }).run()
  database.insert(runGroup).values({ id: groupId, clubId, eventId: of, name: groupId, order: 1 }).run()
  const own = { id: entryId, clubId, eventId: of, carId, groupId, code: ++cars, number, plate: number }
  database
    .insert(entry)
    .values({ ...own, facts: {}, note: '', passengerSeats: 0, withdrawn: false })
    .run()
  database
    .insert(person)
    .values({ id: personId, clubId, eventId: of, name: `Driver of ${number}`, email })
    .run()
  database.insert(entryPerson).values({ clubId, entryId, personId, role: 'driver' }).run()
  return { entryId, personId }
}

describe('sending', () => {
  test('a mail arrives once, as it was written, and is noted as sent', async () => {
    aMail()
    expect(await send(smtp())).toEqual({ sent: 1, failed: 0 })
    expect(await send(smtp())).toEqual({ sent: 0, failed: 0 })

    const [mail] = server.received
    expect(server.received).toHaveLength(1)
    expect([mail?.subject, mail?.text?.trim(), mail?.from?.text]).toEqual([
      'Declare your car',
      'Hello.',
      '"Marram Track Days" <office@marram.example>',
    ])
    expect(mail?.messageId).toBe(`<${rows()[0]?.id}@marram.example>`)
    expect(rows()).toMatchObject([{ sentAt: START, tries: 1, lastError: null, failedAt: null }])
  })

  test('a transaction that fails leaves no mail behind', () => {
    const work = () =>
      transaction(fresh.database, () => {
        aMail()
        throw new Error('the cause was not kept')
      })
    expect(work).toThrow('the cause was not kept')
    expect(rows()).toEqual([])
  })

  test('the same mail is written once', () => {
    expect([aMail('a@x.example', 'invitation:1'), aMail('a@x.example', 'invitation:1')]).toEqual([true, false])
    expect(rows()).toHaveLength(1)
  })

  test('an address that would be two receivers or a header is one that does not work, never two', async () => {
    aMail('a@marram.example, b@marram.example')
    aMail('a@marram.example\r\nBcc: c@marram.example')
    await send(smtp())

    const receivers = server.received.flatMap(({ to, bcc }) => [to, bcc].flat().flatMap((one) => one?.value ?? []))
    expect(receivers.filter(({ address }) => address === 'b@marram.example' || address === 'c@marram.example')).toEqual([])
  })

  test('two senders at once send each mail once', async () => {
    for (let count = 0; count < 8; count += 1) aMail(`driver${count}@marram.example`)
    await Promise.all([send(smtp()), send(smtp()), send(smtp())])

    expect(new Set(server.received.map(({ messageId }) => messageId)).size).toBe(8)
    expect(server.received).toHaveLength(8)
  })

  test('a sender that was killed in the middle: another takes the mail up ten minutes later', async () => {
    aMail()
    const never: MailSender = { kind: 'smtp', send: () => new Promise(() => undefined) }
    void send(never)
    expect(await send(smtp())).toEqual({ sent: 0, failed: 0 })
    passes(601_000)

    expect(await send(smtp())).toEqual({ sent: 1, failed: 0 })
  })
})

describe('a server that fails', () => {
  test('421 at the door or 450 at the receiver: kept, tried again a minute later, sent', async () => {
    aMail()
    server.answers.push(450)
    expect(await send(smtp())).toEqual({ sent: 0, failed: 1 })
    expect(rows()).toMatchObject([
      { tries: 1, failedAt: null, nextTryAt: START + 60_000, lastError: expect.stringContaining('450 come back later') },
    ])
    passes(59_000)
    expect(await send(smtp())).toEqual({ sent: 0, failed: 0 })
    passes(1_000)

    expect(await send(smtp())).toEqual({ sent: 1, failed: 0 })
    expect(rows()).toMatchObject([{ tries: 2, lastError: null, sentAt: START + 60_000 }])
  })

  test('421 instead of a greeting is a server that is busy', async () => {
    const busy = await aMailServer({
      onConnect: (_session, done) => done(Object.assign(new Error('too many lines'), { responseCode: 421 })),
    })
    aMail()
    await send(smtp(busy.url))
    await busy.close()

    expect(rows()).toMatchObject([{ tries: 1, failedAt: null, lastError: expect.stringContaining('421') }])
  })

  test('550: given up at once and shown with what the server said; tried again when the organiser says so', async () => {
    aMail()
    server.answers.push(550)
    await send(smtp())
    passes(48 * HOUR)
    expect(await send(smtp())).toEqual({ sent: 0, failed: 0 })
    const { mails } = await sees()
    expect(mails).toMatchObject([{ state: 'given-up', tries: 1, nextTryAt: null, why: expect.stringContaining('550 no such person here') }])

    expect(await triesAgain(mails[0]?.id ?? '')).toMatchObject({ status: 200, json: { state: 'waits' } })
    expect(await send(smtp())).toEqual({ sent: 1, failed: 0 })
    expect((await sees()).mails).toMatchObject([{ state: 'sent' }])
  })

  test('a server that offers no secure line is told nothing, and the mail stays', async () => {
    aMail()
    await send(smtp(server.url, { allowPlain: false }))

    expect(server.received).toEqual([])
    expect(rows()).toMatchObject([{ failedAt: null, lastError: 'The mail server offers no secure line, so nothing was handed over.' }])
  })

  test('a wrong password gives up no mail: it is the same for all of them, and can be put right', async () => {
    const strict = await aMailServer({
      authOptional: false,
      allowInsecureAuth: true,
      onAuth: (_auth, _session, done) => done(new Error('wrong password')),
    })
    aMail()
    await send(smtp(strict.url.replace('//', '//office:secret@')))
    await strict.close()

    expect(rows()).toMatchObject([{ failedAt: null, lastError: expect.stringContaining('does not accept our name and password') }])
    expect(rows()[0]?.lastError).not.toContain('secret')
  })

  test('a server that never says a word is given up after a while, and the mail stays', async () => {
    const silent = await aSilentServer()
    aMail()
    expect(await send(smtp(silent.url, { patienceMs: 200 }))).toEqual({ sent: 0, failed: 1 })
    await silent.close()

    expect(rows()).toMatchObject([{ failedAt: null, lastError: expect.stringContaining('could not be reached') }])
  })

  test('nobody there: tried for about a day, then given up, and still there', async () => {
    aMail()
    const gone = smtp('smtp://127.0.0.1:9')
    for (let rounds = 0; rounds < 60 && rows()[0]?.failedAt === null; rounds += 1) {
      await send(gone)
      passes(HOUR)
    }

    expect(rows()).toMatchObject([{ tries: 19, sentAt: null }])
    expect(((rows()[0]?.failedAt ?? 0) - START) / HOUR).toBeGreaterThan(20)
  })
})

test('the loop sends by itself, and stopped it sends no more', async () => {
  vi.useFakeTimers({ now: START, toFake: ['Date', 'setTimeout', 'clearTimeout'] })
  const planned = vi.fn()
  const loop = startMailLoop({ database: fresh.database, sender: inboxMailSender, now: Date.now, random: () => 0.5 }, planned)
  aMail()
  await vi.advanceTimersByTimeAsync(2_000)
  expect(rows()).toMatchObject([{ tries: 1 }])
  await loop.stop()
  aMail()
  await vi.advanceTimersByTimeAsync(60_000)

  expect(rows().filter(({ sentAt }) => sentAt === null)).toHaveLength(1)
  expect(planned).toHaveBeenCalledTimes(1)
})

describe('an organiser', () => {
  test('sees how many are not invited, sends that many, each with a link of its own, and nobody twice', async () => {
    const { entryId, personId } = anEntry('7', 'Idris@Marram.example ')
    anEntry('47', 'una@marram.example')
    anEntry('48', 'phone me')
    anEntry('49', null)
    const before = await sees()
    expect(before).toMatchObject({ sender: 'inbox', due: { invitations: 2 }, drivers: 4 })
    expect(before.withoutAddress).toEqual([
      { number: '48', name: 'Driver of 48' },
      { number: '49', name: 'Driver of 49' },
    ])
    expect(await writes('invitations', 2)).toMatchObject({ status: 200, json: { written: 2 } })
    await send(inboxMailSender)

    const mail = readInbox(fresh.database, club.clubId).find(({ to }) => to === 'idris@marram.example')
    const token = /\/entry\/([\w-]+)/.exec(mail?.text ?? '')?.[1] ?? ''
    const link = fresh.database.select().from(entryLink).all().find(({ tokenHash }) => tokenHash === sha256(token)) // prettier-ignore
    expect(link).toMatchObject({ entryId, personId })
    expect((await sees()).due.invitations).toBe(0)
    expect(await writes('invitations', 2)).toMatchObject({ status: 409, json: { code: 'mail-count-changed' } })
    expect(rows()).toHaveLength(2)
    expect(fresh.database.select().from(audit).all()).toMatchObject([{ action: 'mail-written', detail: { what: 'invitations', mails: 2 } }])
  })

  test('writes nothing where the number is another one than was seen', async () => {
    anEntry('7', 'idris@marram.example')
    anEntry('47', 'una@marram.example')

    expect(await writes('invitations', 1)).toMatchObject({ status: 409 })
    expect([rows(), fresh.database.select().from(entryLink).all()]).toEqual([[], []])
  })

  test('of another club sees and sends nothing, and tries nobody’s mail again', async () => {
    aMail()
    const id = rows()[0]?.id ?? ''
    const other = await aClub(fresh.database, 'Another club')
    organiser = (await startSession(fresh.database, other.addAccount('organiser', 'x@else.example'), '')).split(';')[0] ?? ''

    expect((await ask(GET, { path: path(), params: params(), cookie: organiser })).status).toBe(404)
    expect((await writes('invitations', 1)).status).toBe(404)
    expect((await triesAgain(id)).status).toBe(404)
    expect(readInbox(fresh.database, other.clubId)).toEqual([])
  })

  test('tries no mail again that is another event’s, none at all, or sent', async () => {
    aMail()
    const id = rows()[0]?.id ?? ''
    await send(inboxMailSender)
    expect(await triesAgain(id)).toMatchObject({ status: 200, json: { state: 'sent' } })
    expect((await triesAgain(noSuchId())).status).toBe(404)
    event = club.addEvent(2)

    expect((await triesAgain(id)).status).toBe(404)
  })
})

describe('a week before', () => {
  const worries = [{ weight: 'fail', prompt: 'Cabin: harness label', words: 'valid until 2024.' }] as const
  const preChecks = (numbers: readonly string[]): readonly PreCheckRow[] =>
    fresh.database
      .select()
      .from(entry)
      .all()
      .map(({ id, number }) => {
        const isDeclared = numbers.includes(number)
        return { entry: id, number, model: 'Oriel GT4', drivers: [`Driver of ${number}`], version: isDeclared ? 1 : null, worries: isDeclared ? worries : [] } // prettier-ignore
      })
  const looks = (numbers = ['7']) =>
    writeWouldNotBePassed(fresh.database, () => preChecks(numbers), 'https://bay.marram.example', Date.now())

  test('the entrant is told what would not be passed and the organiser of all, once; a later declaration is told when it comes', async () => {
    anEntry('7', 'idris@marram.example')
    anEntry('47', 'una@marram.example')
    expect(looks()).toBe(0)
    passes(24 * HOUR)
    expect(looks()).toBe(2)
    expect([looks(), looks()]).toEqual([0, 0])
    expect(looks(['7', '47'])).toBe(1)
    await send(inboxMailSender)

    const mails = readInbox(fresh.database, club.clubId)
    expect(mails.map(({ to }) => to).sort()).toEqual(['idris@marram.example', 'o@marram.example', 'una@marram.example'])
    const list = mails.find(({ to }) => to === 'o@marram.example')
    expect(list?.subject).toBe('Day 1: 1 of 1 declared cars would not be passed')
    expect(list?.text).toContain('7, Oriel GT4, Driver of 7\n- Cabin: harness label: valid until 2024.')
    expect(list?.text).not.toContain('/entry/')
  })

  test('nobody is told once the event has begun, nor of another event', () => {
    anEntry('7', 'idris@marram.example')
    vi.setSystemTime(Date.parse('2026-05-08T23:30:00Z'))
    // The venue is an hour ahead: there the first day has begun.
    expect(fresh.database.select().from(eventTable).get()?.timeZone).toBe('Europe/London')
    expect(looks()).toBe(0)
    expect(rows()).toEqual([])
  })
})
