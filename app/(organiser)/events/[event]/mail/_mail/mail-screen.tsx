'use client'

import Link from 'next/link'
import { useState } from 'react'
import { EmptyState } from '@/app/_ui/empty-state'
import { Notice } from '@/app/_ui/notice'
import { type EventMail, MAILINGS, type Mailing } from '@/lib/contracts/mail'
import type { Problem } from '@/lib/contracts/problem'
import { MailTable } from './mail-table'
import { MailingPanel } from './mailing-panel'
import { useMail } from './use-mail'

/** The event's mail: what can be sent to many at once, and what became of each mail. */
export function MailScreen({ eventId, timeZone }: { readonly eventId: string; readonly timeZone: string }) {
  const { mail, problem, write, again } = useMail(eventId)
  const [refused, setRefused] = useState<Problem | null>(null)
  const [said, setSaid] = useState('')

  async function onWrite(what: Mailing, expected: number): Promise<void> {
    const failed = await write(what, expected)
    setRefused(failed)
    setSaid(failed ? '' : `${expected === 1 ? '1 mail is' : `${expected} mails are`} on the way.`)
  }

  return (
    <div className="grid gap-6">
      <p role="status" className={said === '' ? 'sr-only' : 'border-l-8 border-accent bg-surface p-4 font-bold'}>
        {said}
      </p>
      {problem && (
        <Notice
          happened={problem.what}
          kept="What you see is as it was before."
          todo={`${problem.todo} The list is asked for again by itself.`}
        />
      )}
      {refused && <Notice happened={refused.what} kept={refused.kept} todo={refused.todo} />}
      {mail === null ? (
        <p>{problem ? 'The mail is not here yet.' : 'Asking for the mail …'}</p>
      ) : (
        <>
          <WhereItGoes mail={mail} />
          <div className="grid gap-6 md:grid-cols-2 xl:grid-cols-4">
            {MAILINGS.map((what) => (
              <MailingPanel key={what} what={what} due={mail.due[what]} onWrite={(expected) => onWrite(what, expected)} />
            ))}
          </div>
          {mail.mails.length === 0 ? (
            <EmptyState title="No mail yet">Invite the drivers: each gets a link to the entry.</EmptyState>
          ) : (
            <MailTable mails={mail.mails} timeZone={timeZone} onAgain={(one) => void again(one.id).then(setRefused)} />
          )}
        </>
      )}
    </div>
  )
}

/** Whether anything leaves this machine, and whom no mail can reach. */
function WhereItGoes({ mail: { sender, drivers, withoutAddress } }: { readonly mail: EventMail }) {
  return (
    <div className="grid gap-2">
      {sender === 'inbox' && (
        <p>
          No mail server is set, so nothing leaves this machine: every mail can be read in the{' '}
          <Link href="/inbox" className="text-accent underline underline-offset-4">
            inbox
          </Link>
          .
        </p>
      )}
      {withoutAddress.length > 0 && (
        <details>
          <summary className="target inline-flex cursor-pointer items-center font-bold">
            {withoutAddress.length} of {drivers} drivers have no address: no mail reaches them
          </summary>
          <p className="mt-1">{withoutAddress.map(({ number, name }) => `${number} ${name}`).join(' · ')}</p>
        </details>
      )}
    </div>
  )
}
