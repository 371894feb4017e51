'use client'

import { useState } from 'react'
import { useDay } from '@/app/_crew/day-context'
import { ProblemNotice } from '@/app/_crew/problem-notice'
import { useAction } from '@/app/_crew/use-action'
import { Button } from '@/app/_ui/button'
import { TextField } from '@/app/_ui/field'
import { Notice } from '@/app/_ui/notice'
import type { PassList } from '@/lib/pass/pass-list'
import type { PitDevice } from '@/lib/pass/pit-device'
import { applyReadBack, type ReadBackHeard } from '@/lib/pass/read-back'
import type { HeardReadBack } from './pit-memory'

interface ReadBackFormProps {
  readonly list: PassList | null
  readonly device: PitDevice
  readonly onHeard: (heard: HeardReadBack) => void
}

/**
 * What was heard on the radio (rule P5): every number that may not run, and how many passes live. The numbers stop their cars at once, whatever else;
 * only when the count agrees does the list count as fresh. It is recorded as a comment on the event.
 */
export function ReadBackForm({ list, device, onHeard }: ReadBackFormProps) {
  const day = useDay()
  const { busy, problem, act } = useAction()
  const [numbers, setNumbers] = useState('')
  const [count, setCount] = useState('')
  const [result, setResult] = useState<ReadBackHeard | null>(null)

  const submit = async () => {
    const heard = { numbers: numbersIn(numbers), livePasses: Number(count) }
    const read = applyReadBack(list, heard, device.now)
    // First the blocks, then the record: a full store must not let a held car out.
    onHeard({ at: device.now, numbers: heard.numbers, agrees: read.agrees })
    setResult(read)
    setNumbers('')
    setCount('')
    const event = day.status().event
    if (event === null) return
    const text = `Radio read-back against list ${list?.version ?? 'none'}: holds ${heard.numbers.join(', ') || 'none'}; ${heard.livePasses} live passes heard, ${read.counted} counted here; ${read.agrees ? 'agrees' : 'does not agree'}.`
    await act(() =>
      day.record([{ kind: 'comment', subject: { event: event.id }, notes: ['note:read-back'] }], [{ ref: 'read-back', text }]),
    )
  }

  return (
    <form
      className="grid gap-3"
      onSubmit={(event) => {
        event.preventDefault()
        void submit()
      }}
    >
      <h3 className="text-lg">Heard on the radio</h3>
      <TextField
        label="Numbers that may not run"
        description="With a comma or a space between them; empty when none was named."
        value={numbers}
        autoComplete="off"
        onChange={({ target }) => setNumbers(target.value)}
      />
      <TextField
        label="Live passes"
        inputMode="numeric"
        pattern="[0-9]+"
        required
        autoComplete="off"
        value={count}
        onChange={({ target }) => setCount(target.value.replace(/\D/g, '').slice(0, 4))}
      />
      <Button type="submit" size="large" isBusy={busy} disabled={count === ''}>
        Take it in
      </Button>
      {result && <Outcome result={result} />}
      <ProblemNotice problem={problem} />
    </form>
  )
}

function Outcome({ result: { agrees, blocks, unknown, counted } }: { readonly result: ReadBackHeard }) {
  if (agrees)
    return (
      <Notice
        weight="news"
        happened="The count agrees: this list counts as fresh from now."
        kept={`${blocks.length} numbers are held here.`}
      />
    )
  const odd = unknown.length > 0 ? ` Not on this list: ${unknown.join(', ')}.` : ''
  return (
    <Notice
      happened={`It does not agree: this list comes to ${counted} live passes.${odd}`}
      kept={`${blocks.length} numbers are held here all the same. The list stays as old as it is.`}
      todo="Ask for it again, or go where there is signal."
    />
  )
}

function numbersIn(text: string): readonly string[] {
  return [...new Set(text.toUpperCase().split(/[\s,;]+/))].filter((number) => number !== '')
}
