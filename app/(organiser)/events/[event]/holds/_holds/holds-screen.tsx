'use client'

import { useState } from 'react'
import { Notice } from '@/app/_ui/notice'
import { EmptyState } from '@/app/_ui/empty-state'
import { Tabs } from '@/app/_ui/tabs'
import type { Holds } from '@/lib/contracts/holds'
import { useHolds } from '@/lib/holds/use-holds'
import { HoldList } from './hold-list'
import { TwoLivePasses } from './two-live-passes'

interface HoldsScreenProps {
  readonly eventId: string
  readonly first: Holds
  readonly mayVoid: boolean
}

const TABS = [
  {
    state: 'standing',
    label: 'Standing',
    none: 'Nothing is held',
    hint: 'A hold made at the pit exit or in the bay, and a recall that is due, comes here at once.',
  },
  {
    state: 'waiting',
    label: 'To come',
    none: 'No recall is waiting',
    hint: 'A recall that is not due yet comes here with what makes it due.',
  },
  {
    state: 'ended',
    label: 'Ended',
    none: 'Nothing has ended yet',
    hint: 'What was seen again or lifted stays here, with when, by whom and why.',
  },
] as const

/** All holds, recalls and dispensations of the event, standing, to come and ended, with times and people; above them the cars with two live passes. */
export function HoldsScreen({ eventId, first, mayVoid }: HoldsScreenProps) {
  const { holds, problem, renew } = useHolds(eventId, first)
  const [state, setState] = useState<(typeof TABS)[number]['state']>('standing')
  const current = TABS.find((tab) => tab.state === state) ?? TABS[0]
  const lines = holds.lines.filter((line) => line.state === state)
  return (
    <div className="grid gap-6">
      {problem && <Notice happened={problem.what} kept="What is shown is from before." todo={problem.todo} />}
      {holds.isWet && <p className="text-xl font-bold">Wet is declared.</p>}
      <TwoLivePasses eventId={eventId} cars={holds.twoPasses} timeZone={holds.timeZone} mayVoid={mayVoid} onVoided={renew} />
      <Tabs
        label="Holds and recalls"
        tabs={TABS.map(({ state: id, label }) => ({ id, label: `${label} (${holds.lines.filter((line) => line.state === id).length})` }))}
        current={state}
        onChange={(id) => setState(TABS.find((tab) => tab.state === id)?.state ?? 'standing')}
      >
        {lines.length === 0 ? <EmptyState title={current.none}>{current.hint}</EmptyState> : <HoldList lines={lines} holds={holds} />}
      </Tabs>
    </div>
  )
}
