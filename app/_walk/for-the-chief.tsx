'use client'

import { useState, type ReactNode } from 'react'
import { useDay } from '@/app/_crew/day-context'
import { useChiefsDevice } from '@/app/_crew/use-chiefs-device'
import { Button } from '@/app/_ui/button'
import { OutcomeShape, type OutcomeState } from '@/app/_ui/outcome-shape'
import { isKnown } from '@/lib/inspection/record'
import { rulingChoices } from '@/lib/inspection/ruling-choices'
import { can } from '@/lib/permissions/policy'
import { useDayStatus } from '@/lib/sync/client/use-day'
import { AdoptSheet } from './adopt-sheet'
import { DispenseSheet } from './dispense-sheet'
import { RulingSheet } from './ruling-sheet'
import { setAsideHere } from './set-aside-here'
import type { Walk } from './use-walk'
import { VoidSheet } from './void-sheet'

interface Act {
  readonly id: string
  readonly shape: OutcomeState
  readonly words: string
  readonly button: string
  readonly sheet: (onClose: () => void) => ReactNode
}

/** What only the chief does, each with the thing it is about: accept a fail, rule on two who differ, void, adopt. Elsewhere nothing of it is offered. */
export function ForTheChief({ walk }: { readonly walk: Walk }) {
  const day = useDay()
  const isChief = useChiefsDevice()
  const { unlocked } = useDayStatus(day)
  const [open, setOpen] = useState<string | null>(null)
  const mayVoid = can(unlocked?.roles ?? [], 'record:void')
  const isOnSharedDevice = !isChief && (unlocked?.roles.includes('chief') ?? false)
  const acts = [...(isChief ? chiefActs(walk, day) : []), ...(mayVoid ? voids(walk) : [])]
  if (acts.length === 0 && !isOnSharedDevice) return null
  const opened = acts.find(({ id }) => id === open)
  return (
    <section className="border-t pt-3" aria-labelledby="for-the-chief">
      <h2 id="for-the-chief" className="text-lg">
        For the chief
      </h2>
      {isOnSharedDevice && (
        <p className="text-muted">
          Rulings, dispensations and lifting need a device that was enrolled for the chief alone. Others unlock this one too.
        </p>
      )}
      <ul>
        {acts.map(({ id, shape, words, button }) => (
          <li key={id} className="flex flex-wrap items-center gap-3 border-t border-line py-2">
            <OutcomeShape state={shape} className="size-6" />
            <span className="min-w-0 grow">{words}</span>
            <Button look="secondary" aria-label={`${button}: ${words}`} onClick={() => setOpen(id)}>
              {button}
            </Button>
          </li>
        ))}
      </ul>
      {opened?.sheet(() => setOpen(null))}
    </section>
  )
}

function chiefActs(walk: Walk, day: ReturnType<typeof useDay>): readonly Act[] {
  const { state, book } = walk
  const checks = [...state.checks.values()]
  const named = (check: string) => book?.byId.get(check)?.prompt ?? check
  return [
    ...checks
      .filter(({ standing }) => standing === 'fail')
      .map(({ check }): Act => {
        const words = `Not so: ${named(check)}`
        return {
          id: `fail ${check}`,
          shape: 'fail',
          words,
          button: 'Accept it',
          sheet: (onClose) => <DispenseSheet walk={walk} check={check} onClose={onClose} />,
        }
      }),
    ...checks
      .filter(({ disagreement }) => disagreement)
      .map(({ check }): Act => {
        const choices = rulingChoices(day.log(state.key), state, check)
        const words = `Two looks differ: ${named(check)}`
        return {
          id: `differ ${check}`,
          shape: 'ask',
          words,
          button: 'Rule',
          sheet: (onClose) => <RulingSheet walk={walk} check={check} choices={choices} onClose={onClose} />,
        }
      }),
    ...setAsideHere(day, state.key).map((entry): Act => {
      const kind = isKnown(entry.record) ? entry.record.kind.replaceAll('-', ' ') : 'record of a newer version'
      const about = isKnown(entry.record) && 'check' in entry.record ? ` of “${named(entry.record.check)}”` : ''
      const words = `Set aside: a ${kind}${about}`
      return {
        id: entry.hash,
        shape: 'ask',
        words,
        button: 'Adopt',
        sheet: (onClose) => <AdoptSheet walk={walk} entry={entry} onClose={onClose} />,
      }
    }),
  ]
}

function voids(walk: Walk): readonly Act[] {
  return walk.state.passes
    .filter(({ state }) => state === 'live')
    .map((pass): Act => {
      const words = pass.record.kind === 'band' ? `Band ${pass.record.bandNumber} lives` : 'Its pass lives'
      return {
        id: pass.hash,
        shape: 'ok',
        words,
        button: 'Void',
        sheet: (onClose) => <VoidSheet walk={walk} pass={pass} onClose={onClose} />,
      }
    })
}
