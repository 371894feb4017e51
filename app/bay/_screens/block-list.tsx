'use client'

import { useState } from 'react'
import { useDay } from '@/app/_crew/day-context'
import { ProblemNotice } from '@/app/_crew/problem-notice'
import { useAction } from '@/app/_crew/use-action'
import { clockTime } from '@/app/_crew/say-when'
import { Button } from '@/app/_ui/button'
import { OutcomeShape } from '@/app/_ui/outcome-shape'
import { blocksOf } from '@/lib/pass/build-pass-list'
import { can } from '@/lib/permissions/policy'
import { useDayStatus } from '@/lib/sync/client/use-day'
import type { Walk } from './use-walk'

/** Holds and due recalls: why, since when, what to see again; the chief may lift a hold, with the reason in words. */
export function BlockList({ walk }: { readonly walk: Walk }) {
  const day = useDay()
  const { unlocked } = useDayStatus(day)
  const [why, setWhy] = useState('')
  const { problem, act } = useAction()
  const { blocks } = walk.state
  if (blocks.length === 0) return null
  const listed = blocksOf(walk.state, walk.book).filter(({ kind }) => kind !== 'fail')
  const holds = blocks.filter(({ kind }) => kind === 'hold' || kind === 'unknown')
  const mayLift = can(unlocked?.roles ?? [], 'record:lifted') && holds.length > 0

  const lift = async () => {
    await act(async () => {
      await day.record([{ kind: 'lifted', subject: walk.subject, holds: holds.map(({ hash }) => hash), why: why.trim() }])
    })
  }

  return (
    <section className="border-l-8 border-line bg-surface p-4">
      <h2 className="flex items-center gap-2 text-lg">
        <OutcomeShape state="held" className="size-7" /> Held
      </h2>
      <ul className="mt-2 grid gap-2">
        {listed.map((block) => (
          <li key={`${block.kind} ${block.words} ${block.at}`}>
            <span className="font-bold">{block.words}</span>
            {block.at !== null && `, ${clockTime(block.at, day.snapshot()?.event.timeZone ?? 'UTC')}`}
            {block.seeAgain.length > 0 && <span className="block">See again: {block.seeAgain.join(', ')}</span>}
            {block.stickerRemoved === false && <span className="block">The sticker was left on: take it off.</span>}
          </li>
        ))}
      </ul>
      {mayLift && (
        <form
          className="mt-4 grid gap-2"
          onSubmit={(event) => {
            event.preventDefault()
            void lift()
          }}
        >
          <label className="grid gap-1">
            <span>Lift it without a new look, because</span>
            <input
              className="target rounded-sm border border-line bg-ground px-3"
              value={why}
              maxLength={500}
              required
              minLength={3}
              onChange={(event) => setWhy(event.target.value)}
            />
          </label>
          <Button type="submit" look="secondary">
            Lift the hold
          </Button>
        </form>
      )}
      <ProblemNotice problem={problem} className="mt-3" />
    </section>
  )
}
