'use client'

import { useState } from 'react'
import { classNames } from '@/app/_ui/class-names'
import type { Aboard } from '@/lib/pass/decide-aboard'
import type { PitAnswer } from '@/lib/pass/pit-answer'
import { nameWithBand } from '@/lib/pass/pit-people'

interface PeopleAboardProps {
  readonly answer: PitAnswer
  /** Who was tapped already; null while nobody was asked. */
  readonly aboard: Aboard | null
  readonly onAboard: (aboard: Aboard) => void
}

/** Who may go in the car, by name and band; where some may not, who of them sits in it is to be tapped (rule P8). */
export function PeopleAboard({ answer, aboard, onAboard }: PeopleAboardProps) {
  const { people } = answer
  if (people.length === 0) return null
  const mustSay = aboard !== null || answer.reasons.some(({ code }) => code === 'some-may-not')
  if (mustSay) return <WhoIsAboard answer={answer} aboard={aboard} onAboard={onAboard} />
  // Beside HOLD nothing may read as leave to go: there only who may not is named.
  const named = answer.answer === 'HOLD' ? people.filter(({ may }) => !may) : people
  return (
    <ul>
      {named.map((person) => (
        <li key={person.person}>
          {nameWithBand(person)} {person.may ? (person.drives ? 'may drive' : 'may ride') : `may not: ${person.why}`}
        </li>
      ))}
    </ul>
  )
}

function WhoIsAboard({ answer: { people }, aboard, onAboard }: PeopleAboardProps) {
  const [tapped, setTapped] = useState<readonly string[]>(aboard?.people ?? [])
  const [isStranger, setStranger] = useState((aboard?.unnamed ?? 0) > 0)
  const toggle = (person: string) => setTapped(tapped.includes(person) ? tapped.filter((one) => one !== person) : [...tapped, person])
  return (
    <fieldset className="grid gap-2">
      <legend className="mb-1 font-bold">Who is aboard? Read the wrist.</legend>
      {people.map((person) => (
        <Toggle key={person.person} isOn={tapped.includes(person.person)} onToggle={() => toggle(person.person)}>
          {nameWithBand(person)}
          {!person.may && `, may not: ${person.why}`}
        </Toggle>
      ))}
      <Toggle isOn={isStranger} onToggle={() => setStranger(!isStranger)}>
        Somebody else, or no band on the wrist
      </Toggle>
      <button
        type="button"
        disabled={tapped.length === 0 && !isStranger}
        onClick={() => onAboard({ people: tapped, unnamed: isStranger ? 1 : 0 })}
        className="target heading rounded-sm border-2 border-current px-4 py-2 text-xl disabled:border-dashed"
      >
        That is all aboard
      </button>
    </fieldset>
  )
}

interface ToggleProps {
  readonly isOn: boolean
  readonly onToggle: () => void
  readonly children: React.ReactNode
}

/** Pressed or not, on a ground filled with an outcome's colour: the mark says it, not a colour. */
function Toggle({ isOn, onToggle, children }: ToggleProps) {
  return (
    <button
      type="button"
      aria-pressed={isOn}
      onClick={onToggle}
      className={classNames('target flex items-center gap-3 rounded-sm border-2 border-current px-3 py-2 text-left', isOn && 'font-bold')}
    >
      <span aria-hidden className="grid size-7 shrink-0 place-content-center border-2 border-current">
        {isOn ? '✓' : ''}
      </span>
      <span>{children}</span>
    </button>
  )
}
