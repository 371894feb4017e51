'use client'

import { useState } from 'react'
import { useDay } from '@/app/_crew/day-context'
import { ProblemNotice } from '@/app/_crew/problem-notice'
import { StationPicks } from '@/app/_crew/station-picks'
import { useAction } from '@/app/_crew/use-action'
import { Button } from '@/app/_ui/button'
import { Sheet } from '@/app/_ui/sheet'
import type { RecordOf } from '@/lib/inspection/record'
import { stationsHere } from './stations-here'
import type { Walk } from './use-walk'

interface WidenSheetProps {
  readonly hold: RecordOf<'hold'>
  readonly walk: Walk
  readonly onClose: () => void
}

/** Adds stations to a hold by another hold of the same reason: both have to be answered. Nothing is ever taken away here; that is the chief's. */
export function WidenSheet({ hold, walk, onClose }: WidenSheetProps) {
  const day = useDay()
  const { busy, problem, act } = useAction()
  const [picked, setPicked] = useState<readonly string[]>([])
  const { subject, state } = walk
  const named = new Set(state.blocks.filter(({ reason }) => reason === hold.reason).flatMap(({ stations }) => stations))
  const others = stationsHere(day, subject).filter(({ id }) => !named.has(id))
  const widen = async () => {
    const draft = { kind: 'hold', subject, reason: hold.reason, stations: picked, checks: [], stickerRemoved: hold.stickerRemoved } as const
    if (await act(() => day.record([draft]))) onClose()
  }
  return (
    <Sheet isOpen title="What else is to be seen?" onClose={onClose}>
      <div className="grid gap-4">
        {others.length === 0 ? (
          <p>Every station of this checklist is named already.</p>
        ) : (
          <StationPicks legend="To be seen as well" stations={others} picked={picked} onPick={setPicked} />
        )}
        <ProblemNotice problem={problem} />
        <Button size="large" disabled={picked.length === 0} isBusy={busy} onClick={() => void widen()}>
          Add them to the hold
        </Button>
        <Button look="quiet" onClick={onClose}>
          Leave it as it is
        </Button>
      </div>
    </Sheet>
  )
}
