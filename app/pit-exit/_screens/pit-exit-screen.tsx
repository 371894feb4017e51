'use client'

import { useState } from 'react'
import { useDay } from '@/app/_crew/day-context'
import { HoldSheet } from '@/app/_crew/hold-sheet'
import { recallsHere } from '@/app/_crew/recalls-here'
import { useMinute } from '@/app/_crew/use-minute'
import { blockByClock } from '@/lib/pass/recalls-by-clock'
import { decideAboard } from '@/lib/pass/decide-aboard'
import { decideAtPitExit } from '@/lib/pass/decide-at-pit-exit'
import type { PassList } from '@/lib/pass/pass-list'
import type { PitDevice } from '@/lib/pass/pit-device'
import { useDayStatus, usePassList } from '@/lib/sync/client/use-day'
import { AnswerView } from './answer-view'
import { AskScreen } from './ask-screen'
import { HeldNumbers } from './held-numbers'
import { FindSheet } from './find-sheet'
import { ListSheet } from './list-sheet'
import { pitDeviceOf } from './pit-device-of'
import { PitStrip } from './pit-strip'
import { RunningSheet } from './running-sheet'
import { useAsking, type Asked } from './use-asking'
import { usePitMemory } from './use-pit-memory'

type Open = { readonly what: 'running' | 'list' | 'find' } | { readonly what: 'hold'; readonly entry: string } | null

/** The pit exit: camera, number and code; the answer over all of it; the hold list always below. */
export function PitExitScreen() {
  const day = useDay()
  const status = useDayStatus(day)
  const list = usePassList(day)
  const clock = useMinute()
  const pit = usePitMemory()
  const asking = useAsking(list)
  const [open, setOpen] = useState<Open>(null)
  if (clock === null) return null
  const snapshot = day.snapshot()
  const due = snapshot === null ? [] : recallsHere(day, clock).map((recall) => blockByClock(recall, snapshot))
  const device = pitDeviceOf(clock, status, snapshot, list, pit.memory, due)
  const { asked } = asking
  const held = <HeldNumbers list={list} device={device} onAsk={asking.askNumber} />
  const strip = (
    <PitStrip
      list={list}
      device={device}
      isForgetful={pit.isForgetful}
      onList={() => setOpen({ what: 'list' })}
      onRunning={() => setOpen({ what: 'running' })}
    />
  )
  const hold = (entry: string) => setOpen({ what: 'hold', entry })
  return (
    <main className="flex grow flex-col">
      {/* Under an answer nothing of it can be pressed or heard; the camera stays on, so that the next car need not wait for it. */}
      <div inert={asked !== null} className="flex grow flex-col">
        {strip}
        <AskScreen list={list} asking={asking} onHold={hold} onFind={() => setOpen({ what: 'find' })} />
        <div className="sticky bottom-0 border-t-[3px] bg-ground">{held}</div>
      </div>
      {asked && <AnswerView answer={answerTo(asked, list, device)} asked={asked} asking={asking} strip={strip} held={held} onHold={hold} />}
      <RunningSheet isOpen={open?.what === 'running'} pit={pit} onClose={() => setOpen(null)} />
      <ListSheet isOpen={open?.what === 'list'} list={list} device={device} onHeard={pit.hear} onClose={() => setOpen(null)} />
      {open?.what === 'find' && <FindSheet onPick={hold} onClose={() => setOpen(null)} />}
      {open?.what === 'hold' && (
        <HoldSheet
          entry={open.entry}
          onClose={() => setOpen(null)}
          onHeld={(number) => {
            setOpen(null)
            // Held from the number alone: the answer comes up and says so.
            if (asked === null) asking.askNumber(number)
          }}
        />
      )}
    </main>
  )
}

/** Decided anew with every change of list, clock or log: a hold made here is HOLD at once. */
function answerTo({ ask, aboard }: Asked, list: PassList | null, device: PitDevice) {
  const answer = decideAtPitExit(ask, list, device)
  return aboard === null ? answer : decideAboard(answer, aboard)
}
