'use client'

import { useState } from 'react'
import { useAction, type Action } from '@/app/_crew/use-action'
import { civilDate } from '@/lib/rules/civil-date'
import type { Draft } from '@/lib/sync/client/draft'
import { briefingCheck, briefingDrafts, briefingOf, type AtBriefing } from '@/lib/walk/briefing'
import type { AtDesk, Desk } from './use-desk'

interface Briefing extends Pick<Action, 'busy' | 'problem'> {
  /** Everybody whose book asks for a briefing, and whether a tick may say they were there. */
  readonly people: readonly (AtDesk & { readonly briefing: ReturnType<typeof briefingOf> })[]
  /** What was just saved, in words; null when there is nothing to take back. */
  readonly done: string | null
  /** Saves that these people were at the briefing of that time: one action, all or none (rule M1). Says whether it was saved. */
  readonly save: (people: ReadonlySet<string>, time: string) => Promise<boolean>
  readonly takeBack: () => void
}

interface Undoable {
  readonly words: string
  readonly findings: readonly { readonly person: string; readonly check: string }[]
}

/** Who was at a briefing, many at once. */
export function useBriefing({ day, people }: Desk): Briefing {
  const [last, setLast] = useState<Undoable | null>(null)
  const { busy, problem, act } = useAction()
  const event = day.snapshot()?.event
  const all = people.flatMap((person) => {
    const state = day.state(`person:${person.id}`)
    const pinned = state.presentedHeads[0]?.record
    const book = pinned === undefined ? day.book() : day.book(pinned.checklist, pinned.limits)
    if (book === null || briefingCheck(book) === null) return []
    const at: AtBriefing = { person: person.id, minor: person.minor, state, book }
    return [{ person: { ...person, briefing: briefingOf(at) }, at }]
  })

  const save = async (chosen: ReadonlySet<string>, time: string) => {
    if (event === undefined) return false
    const pins = { checklist: event.checklistHash, limits: event.limitsHash, depth: event.defaultDepth }
    const drafts = briefingDrafts(
      all.flatMap(({ at }) => (chosen.has(at.person) ? [at] : [])),
      { pins, on: civilDate(event.lastDay), note: 'note:briefing' },
    )
    const findings = drafts.flatMap((draft) =>
      draft.kind === 'finding' && 'person' in draft.subject ? [{ person: draft.subject.person, check: draft.check }] : [],
    )
    if (findings.length === 0) return false
    if (!(await act(() => day.record(drafts, [{ ref: 'briefing', text: `At the ${time} briefing` }])))) return false
    setLast({ findings, words: `${findings.length === 1 ? '1 person was' : `${findings.length} people were`} at the ${time} briefing` })
    return true
  }

  const takeBack = () => {
    if (last === null || busy) return
    const drafts = last.findings.map(({ person, check }): Draft => ({ kind: 'finding', subject: { person }, check, outcome: 'unseen' }))
    void act(() => day.record(drafts)).then((isDone) => isDone && setLast(null))
  }

  return { busy, problem, people: all.map(({ person }) => person), done: last === null ? null : `Saved: ${last.words}`, save, takeBack }
}
