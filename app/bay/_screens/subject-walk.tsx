'use client'

import { useState } from 'react'
import { useDay } from '@/app/_crew/day-context'
import { ProblemNotice } from '@/app/_crew/problem-notice'
import { useAction } from '@/app/_crew/use-action'
import { goTo } from '@/app/_crew/use-location'
import { ago } from '@/app/_crew/say-when'
import { useMinute } from '@/app/_crew/status-strip'
import { Button } from '@/app/_ui/button'
import { Notice } from '@/app/_ui/notice'
import { OutcomeShape } from '@/app/_ui/outcome-shape'
import { Wire } from '@/app/_ui/wire'
import type { CarFacts } from '@/lib/checklist/car-facts'
import type { Depth } from '@/lib/checklist/checklist'
import { wireSentence, wireStations } from '@/lib/inspection/wire'
import { subjectKey } from '@/lib/inspection/subject'
import { recallWalk } from '@/lib/walk/walk-memory'
import { nextStop } from '@/lib/walk/walk-plan'
import { BlockList } from './block-list'
import { FactsForm } from './facts-form'
import { OpenDefects } from './open-defects'
import { PassPanel } from './pass-panel'
import { BandPanel } from './band-panel'
import { PlaceList } from './place-list'
import { VERDICT_SHAPES } from './verdict-words'
import type { Walk } from './use-walk'

interface SubjectWalkProps {
  readonly walk: Walk
  /** Address of this subject's walk; its places stand below it. */
  readonly base: string
  /** What is known of it before anybody presents it. */
  readonly told: CarFacts
}

/** One subject's walk from above: the wire, the verdict, what is open, where to go on, and the pass or band when it is earned. */
export function SubjectWalk({ walk, base, told }: SubjectWalkProps) {
  const day = useDay()
  const [changing, setChanging] = useState(false)
  const { busy, problem, act } = useAction()
  const now = useMinute()
  const { state, book, plan } = walk
  const kind = 'car' in walk.subject ? 'car' : 'person'
  if (!book)
    return (
      <Notice
        happened="The checklist this walk needs is not on this device."
        kept="Nothing was lost."
        todo="Load the day again where there is signal."
        className="m-4"
      />
    )

  const present = async (facts: CarFacts, depth: Depth) => {
    const event = day.snapshot()?.event
    if (!event) return
    await act(async () => {
      await day.record([
        {
          kind: 'presented',
          subject: walk.subject,
          checklist: event.checklistHash,
          limits: event.limitsHash,
          declaration: ('car' in walk.subject ? day.entry(walk.subject.car)?.declaration : null) ?? null,
          facts,
          depth,
        },
      ])
      setChanging(false)
    })
  }

  const isPresented = state.presentedHeads.length > 0
  const stations = wireStations(state, book)
  const left = recallWalk(localStorage, subjectKey(walk.subject))
  const next = nextStop(plan, left)
  const passed = state.verdict === 'passed' || state.verdict === 'passed with advisories'
  return (
    <div className="grid gap-4 px-4 pb-6">
      <Wire
        scale="full"
        bolts={stations.map(({ short, state: bolt }) => ({ label: short, state: bolt }))}
        sentence={wireSentence(stations)}
      />
      <p role="status" className="flex items-center gap-3 text-xl font-bold">
        <OutcomeShape state={VERDICT_SHAPES[state.verdict]} className="size-9" />
        {state.verdict}
      </p>
      <ProblemNotice problem={problem} />
      <BlockList walk={walk} />
      {!isPresented || changing ? (
        <section className="grid gap-3">
          <h2 className="text-lg">{kind === 'car' ? 'What stands before you' : 'Who stands before you'}</h2>
          <FactsForm
            book={book}
            kind={kind}
            known={walk.facts ?? told}
            depth={walk.depth ?? day.snapshot()?.event.defaultDepth ?? 'standard'}
            busy={busy}
            onPresent={(facts, depth) => void present(facts, depth)}
          />
        </section>
      ) : (
        <>
          {passed && kind === 'car' && <PassPanel walk={walk} />}
          {passed && kind === 'person' && <BandPanel walk={walk} />}
          <OpenDefects walk={walk} base={base} />
          <PlaceList plan={plan} base={base} />
          {next && (
            <Button size="large" onClick={() => goTo(`${base}/${next.place}`)}>
              {left && next.place === left.place
                ? `Go on: ${placeTitle(walk, next.place)}, you were here ${ago((now ?? left.at) - left.at)}`
                : `Go on: ${placeTitle(walk, next.place)}`}
            </Button>
          )}
          <Button look="quiet" className="justify-self-start" onClick={() => setChanging(true)}>
            {kind === 'car' ? 'The car is otherwise than said' : 'The kit is otherwise than said'}
          </Button>
        </>
      )}
    </div>
  )
}

function placeTitle(walk: Walk, place: string): string {
  return walk.plan.find((one) => one.place.id === place)?.place.title ?? place
}
