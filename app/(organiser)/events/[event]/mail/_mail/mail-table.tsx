'use client'

import { clockTime, dayWords } from '@/app/_crew/say-when'
import { Button } from '@/app/_ui/button'
import { DataTable, Td, Th } from '@/app/_ui/data-table'
import type { MailView } from '@/lib/contracts/mail'
import { venueDay } from '@/lib/rules/venue-day'

interface MailTableProps {
  readonly mails: readonly MailView[]
  readonly timeZone: string
  readonly onAgain: (mail: MailView) => void
}

const KINDS: Readonly<Record<MailView['kind'], string>> = {
  invitation: 'invitation',
  'declaration-reminder': 'declaration reminder',
  'would-not-be-passed': 'would not be passed',
  result: 'result',
  'crew-invitation': 'crew invitation',
}

/** Every mail of the event: what was given up first, then what waits, then what was sent. */
export function MailTable({ mails, timeZone, onAgain }: MailTableProps) {
  const count = (state: MailView['state']) => mails.filter((mail) => mail.state === state).length
  return (
    <DataTable caption={`Mail: ${count('sent')} sent, ${count('waits')} waiting, ${count('given-up')} given up`}>
      <thead>
        <tr>
          <Th>Number</Th>
          <Th>Mail</Th>
          <Th>To</Th>
          <Th>State</Th>
        </tr>
      </thead>
      <tbody>
        {mails.map((mail) => (
          <tr key={mail.id}>
            <Th scope="row">{mail.number === '' ? '–' : mail.number}</Th>
            <Td>{KINDS[mail.kind]}</Td>
            <Td className="break-all">{mail.to}</Td>
            <Td>
              <MailState mail={mail} timeZone={timeZone} />
              {mail.state !== 'sent' && mail.why !== null && (
                <Button
                  look="quiet"
                  className="-ml-4"
                  aria-label={`Try again: ${KINDS[mail.kind]} to ${mail.to}`}
                  onClick={() => onAgain(mail)}
                >
                  Try again
                </Button>
              )}
            </Td>
          </tr>
        ))}
      </tbody>
    </DataTable>
  )
}

function MailState({ mail, timeZone }: { readonly mail: MailView; readonly timeZone: string }) {
  // Mail goes out over weeks: a time alone would say little.
  const at = (time: number) => `${dayWords(venueDay(time, timeZone))}, ${clockTime(time, timeZone)}`
  const { state, sentAt, nextTryAt, tries, why } = mail
  if (state === 'sent') return <>sent {at(sentAt ?? 0)}</>
  if (why === null) return <>waits to be sent</>
  const times = tries === 1 ? 'once' : `${tries} times`
  return (
    <>
      <span className="font-bold">{state === 'given-up' ? `given up, tried ${times}` : `tried ${times}, again ${at(nextTryAt ?? 0)}`}</span>
      <span className="block">{why}</span>
    </>
  )
}
