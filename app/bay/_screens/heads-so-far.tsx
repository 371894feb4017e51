'use client'

import { useDay } from '@/app/_crew/day-context'
import { clockTime } from '@/app/_crew/say-when'
import { OutcomeShape } from '@/app/_ui/outcome-shape'
import type { Head } from '@/lib/inspection/state'
import { explainJudgement } from '@/lib/rules/explain'
import type { WalkItem } from '@/lib/walk/walk-plan'

const SHAPES = { ok: 'ok', advisory: 'advisory', fail: 'fail', 'could-not-see': 'ask', unseen: 'none' } as const
const WORDS = { ok: 'ok', advisory: 'advisory', fail: 'fail', 'could-not-see': 'could not see', unseen: 'taken back' } as const

/** What has been said of this check already: who, when, on what grounds. Two who differ are both shown. */
export function HeadsSoFar({ item }: { readonly item: WalkItem }) {
  const day = useDay()
  const snapshot = day.snapshot()
  const heads = item.state?.heads ?? []
  if (heads.length === 0) return null
  const nameOf = (id: string) => snapshot?.crew.find((one) => one.id === id)?.name ?? 'somebody of the crew'
  return (
    <div className="mt-3 border-l-4 border-accent pl-3">
      {item.state?.disagreement && (
        <p className="font-bold">Two looks differ. The more severe stands until a new look, or the chief rules.</p>
      )}
      {item.seeAgain && <p className="font-bold">To be seen again: something since has touched it.</p>}
      <ul>
        {heads.map((head) => (
          <li key={head.hash} className="flex items-start gap-2">
            <OutcomeShape state={SHAPES[head.outcome]} className="mt-1 size-5" />
            <span>
              {clockTime(head.record.at, snapshot?.event.timeZone ?? 'UTC')} {WORDS[head.outcome]}, {nameOf(head.record.actor)}
              {reasonOf(head, item)}
              {head.lapsed ? ' (of another day: see it today)' : ''}
              {head.quarantined ? ' (without the right to say so)' : ''}
            </span>
          </li>
        ))}
      </ul>
    </div>
  )
}

function reasonOf(head: Head, item: WalkItem): string {
  const { record } = head
  if (record.kind === 'dispensation') return `: accepted by dispensation, ${record.conditions}`
  if (record.kind === 'ruling') return `: ${record.why}`
  const reason = item.check.reasons.find(({ id }) => id === (record.reason ?? record.found?.reason))?.text
  const judged = record.judgement ? explainJudgement(record.judgement.code, record.judgement.facts) : undefined
  const words = [record.found ? 'put right here' : undefined, reason, judged].filter((part) => part !== undefined)
  return words.length > 0 ? `: ${words.join('. ')}` : ''
}
