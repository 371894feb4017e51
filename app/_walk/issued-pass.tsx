'use client'

import { useDay } from '@/app/_crew/day-context'
import { Button } from '@/app/_ui/button'
import type { PassState } from '@/lib/inspection/state'
import { qrText } from '@/lib/pass/qr-text'
import { showTypedCode, typedCode } from '@/lib/pass/typed-code'
import type { DayEntry } from '@/lib/sync/client/day-client'
import { PassLabel } from './pass-label'

/** A pass that lives: its code on the screen, and its two labels for the printer. */
export function IssuedPass({ pass, entry }: { readonly pass: PassState; readonly entry: DayEntry }) {
  const event = useDay().snapshot()?.event
  if (!event) return null
  const { token, day } = pass.record
  return (
    <>
      <PassLabel
        number={entry.number}
        plate={entry.plate}
        day={day}
        venue={event.venue}
        text={qrText(event.publicOrigin, token)}
        code={showTypedCode(typedCode(token))}
      />
      {pass.conditions.length > 0 && <p className="font-bold">Runs only with: {pass.conditions.join('; ')}</p>}
      <p className="text-muted">
        Seen on the day, without dismantling: no certificate and no warranty. What could not be seen is listed under “Open and noted”. Two
        labels print, for left and right of the screen.
      </p>
      <Button look="secondary" className="justify-self-start" onClick={() => window.print()}>
        Print both labels
      </Button>
    </>
  )
}
