'use client'

import { useState } from 'react'
import { Button } from '@/app/_ui/button'
import { Dialog } from '@/app/_ui/dialog'
import type { Mailing } from '@/lib/contracts/mail'
import { MAILING_WORDS } from './mailing-words'

interface MailingPanelProps {
  readonly what: Mailing
  /** How many mails it would write now. */
  readonly due: number
  readonly onWrite: (expected: number) => Promise<void>
}

/** One mailing: what it says, how many it would be, and the button that asks once more. */
export function MailingPanel({ what, due, onWrite }: MailingPanelProps) {
  // The count that was seen is the count that is sent, whatever the list says meanwhile.
  const [asked, setAsked] = useState<number | null>(null)
  const [busy, setBusy] = useState(false)
  const { title, about, button, nothing } = MAILING_WORDS[what]

  async function send(expected: number): Promise<void> {
    setBusy(true)
    await onWrite(expected)
    setBusy(false)
    setAsked(null)
  }

  return (
    <section className="flex flex-col gap-2 border-t-[3px] pt-3" aria-label={title}>
      <h2 className="text-lg">{title}</h2>
      <p className="grow text-muted">{about}</p>
      {due === 0 ? (
        <p className="font-bold">{nothing}</p>
      ) : (
        <Button look="secondary" onClick={() => setAsked(due)}>
          {button(due)}
        </Button>
      )}
      <Dialog
        isOpen={asked !== null}
        onClose={() => setAsked(null)}
        title={asked === 1 ? 'Send 1 mail?' : `Send ${asked ?? 0} mails?`}
        actions={
          <>
            <Button look="secondary" onClick={() => setAsked(null)}>
              Not now
            </Button>
            <Button isBusy={busy} onClick={() => asked !== null && void send(asked)}>
              Send
            </Button>
          </>
        }
      >
        {title}: {about} What was sent cannot be called back.
      </Dialog>
    </section>
  )
}
