'use client'

import Link from 'next/link'
import { clockTime, dayWords } from '@/app/_crew/say-when'
import { QrCode } from '@/app/_crew/qr-code'
import { buttonClass } from '@/app/_ui/button'
import { Notice } from '@/app/_ui/notice'
import { NumberPlate } from '@/app/_ui/number-plate'
import type { MyEntry } from '@/lib/contracts/my-entry'
import { venueDay } from '@/lib/rules/venue-day'
import { MendList } from './mend-list'
import { PeopleList } from './people-list'
import { Stands } from './stands'
import { useMyEntry } from './use-my-entry'

/** One's own entry: how it stands, what to mend, when it is called, and the code for the bay. */
export function EntryScreen({ first }: { readonly first: MyEntry }) {
  const { entry, lost } = useMyEntry(first)
  return (
    <div className="grid gap-8">
      {lost !== null && (
        <Notice
          weight="news"
          happened={`${lost} This is how it stood at ${clockTime(entry.at, entry.event.timeZone)}.`}
          todo="It is asked again by itself."
        />
      )}
      <header className="flex flex-wrap items-end gap-x-5 gap-y-2">
        <NumberPlate number={entry.number} />
        <div>
          <p className="text-lg font-bold">{entry.model}</p>
          <p>
            {entry.colour} · <span className="serial">{entry.plate}</span>
          </p>
          <p>{entry.group}</p>
        </div>
      </header>
      <Stands entry={entry} />
      <MendList entry={entry} />
      <Declaring entry={entry} />
      <When entry={entry} />
      <PeopleList people={entry.people} />
      {entry.when !== 'over' && !entry.withdrawn && (
        <section aria-labelledby="code" className="grid justify-items-start gap-2">
          <h2 id="code" className="text-xl">
            Entry code
          </h2>
          <p className="max-w-prose">Show it in the bay: their camera finds your car by it, or they type it. It is no pass.</p>
          <QrCode text={entry.codeText} label={`Entry code ${entry.codeText}`} className="w-56 max-w-full border" />
          <p className="serial">{entry.codeText}</p>
        </section>
      )}
    </div>
  )
}

function Declaring({ entry }: { readonly entry: MyEntry }) {
  const { declaration, event, isPresented } = entry
  const at = (instant: number) => `${dayWords(venueDay(instant, event.timeZone))}, ${clockTime(instant, event.timeZone)}`
  return (
    <section aria-labelledby="declaration" className="grid justify-items-start gap-3">
      <h2 id="declaration" className="text-xl">
        Declaration
      </h2>
      {declaration.signedAt === null ? (
        <p>{declaration.draftAt === null ? 'Nothing is declared yet.' : `Begun, not signed; last saved ${at(declaration.draftAt)}.`}</p>
      ) : (
        <p>
          Signed by {declaration.signedBy}, {at(declaration.signedAt)}, version {declaration.version}.
          {declaration.draftAt !== null && ` A change of it is begun and not signed (${at(declaration.draftAt)}).`}
        </p>
      )}
      {entry.mayDeclare ? (
        <Link
          className={buttonClass(declaration.state === 'signed' ? 'secondary' : 'primary', 'large')}
          href={`/entries/${entry.id}/declare`}
        >
          {declaration.draftAt !== null
            ? 'Go on declaring'
            : declaration.state === 'signed'
              ? 'Change what is declared'
              : 'Declare the car'}
        </Link>
      ) : (
        <p className="text-muted">A driver of the car declares it, until the event is over.</p>
      )}
      {isPresented && entry.mayDeclare && (
        <p className="text-muted">The bay has begun to look. What you change now is told there, and is looked at again.</p>
      )}
    </section>
  )
}

function When({ entry }: { readonly entry: MyEntry }) {
  const { event, nextSessionAt, callUp, when } = entry
  const time = (instant: number) => clockTime(instant, event.timeZone)
  const day = (instant: number) => (venueDay(instant, event.timeZone) === entry.day ? 'today' : dayWords(venueDay(instant, event.timeZone)))
  return (
    <section aria-labelledby="when" className="grid gap-2">
      <h2 id="when" className="text-xl">
        When
      </h2>
      {callUp !== null && (
        <p>
          Come to the bay {day(callUp.from)} between <span className="figures text-3xl">{time(callUp.from)}</span> and{' '}
          <span className="figures text-3xl">{time(callUp.to)}</span>.
        </p>
      )}
      {nextSessionAt === null ? (
        <p>{when === 'over' ? 'The event is over.' : 'No session of your group is in the timetable from now on.'}</p>
      ) : (
        <p>
          {entry.group}, {when === 'before' ? 'first' : 'next'} session: {day(nextSessionAt)}{' '}
          <span className="figures text-3xl">{time(nextSessionAt)}</span>
        </p>
      )}
      {callUp === null && when !== 'over' && (
        <p className="text-muted">The bay order is not out yet. Be there well before your first session: a car takes 3 to 12 minutes.</p>
      )}
    </section>
  )
}
