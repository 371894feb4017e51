'use client'

import { useState } from 'react'
import { useAction, type Action } from '@/app/_crew/use-action'
import { goTo } from '@/app/_crew/use-location'
import { NAME_REF, seatDrafts, type TurnedUp } from '@/lib/desk/seat-drafts'
import { searchPeople } from '@/lib/desk/search-people'
import { newId } from '@/lib/platform/ids'
import type { DayEntry } from '@/lib/sync/client/day-client'
import { seatsInLine } from './person-row'
import type { Desk } from './use-desk'

export interface TurnedUpNow extends Pick<Action, 'busy' | 'problem'> {
  readonly name: string
  readonly setName: (name: string) => void
  /** People of that name who sit in a car already: an instructor is not made twice. */
  readonly alike: readonly { readonly id: string; readonly words: string }[]
  /** One of them, or `new`; undefined until it was said. */
  readonly same: string | undefined
  readonly setSame: (same: string) => void
  readonly isNew: boolean
  readonly role: TurnedUp['role'] | undefined
  readonly setRole: (role: TurnedUp['role']) => void
  readonly minor: boolean | undefined
  readonly setMinor: (minor: boolean) => void
  readonly entries: readonly DayEntry[]
  readonly cars: readonly string[]
  readonly setCars: (cars: readonly string[]) => void
  /** What is still to be said, in words; null when nothing is. */
  readonly missing: string | null
  readonly save: () => void
}

/** Names of this many letters are looked up; fewer would find half the paddock. */
const ENOUGH_LETTERS = 3

/** What is entered of somebody who turned up, and saving it: one action, a record for each car. */
export function useTurnedUp({ day, people }: Desk): TurnedUpNow {
  const [name, setName] = useState('')
  const [same, setSame] = useState<string | undefined>(undefined)
  const [role, setRole] = useState<TurnedUp['role'] | undefined>(undefined)
  const [minor, setMinor] = useState<boolean | undefined>(undefined)
  const [cars, setCars] = useState<readonly string[]>([])
  const { busy, problem, act } = useAction()
  const typed = name.trim().replace(/\s+/g, ' ')
  const isWord = typed.length >= ENOUGH_LETTERS && /\p{L}{2}/u.test(typed)
  const alike = isWord
    ? searchPeople(people, typed)
        .slice(0, 4)
        .map((person) => ({ id: person.id, words: `${person.name}: ${seatsInLine(person)}` }))
    : []
  const known = alike.find(({ id }) => id === same)?.id
  const isNew = known === undefined
  // Whoever sits in a car already is not put into it again.
  const entries = day.entries().filter((entry) => !entry.withdrawn && !entry.people.some(({ person }) => person === known))
  const picked = cars.filter((car) => entries.some(({ id }) => id === car))
  const missing = missingWords({
    typed,
    isAsked: alike.length > 0 && same === undefined,
    role,
    isMinorOpen: isNew && minor === undefined,
    picked,
  })

  const save = () => {
    if (missing !== null || role === undefined) return
    const person = known ?? newId()
    const drafts = seatDrafts({ person, role, minor: isNew ? (minor ?? true) : null, isNew, cars: picked })
    void act(() => day.record(drafts, isNew ? [{ ref: NAME_REF, text: typed }] : [])).then((isSaved) => {
      if (isSaved) goTo(`/sign-on/person/${person}`)
    })
  }

  return {
    name,
    setName: (next) => {
      setName(next)
      setSame(undefined)
    },
    alike,
    same,
    setSame,
    isNew,
    role,
    setRole,
    minor,
    setMinor,
    entries,
    cars: picked,
    setCars,
    missing,
    save,
    busy,
    problem,
  }
}

interface Said {
  readonly typed: string
  readonly isAsked: boolean
  readonly role: TurnedUp['role'] | undefined
  readonly isMinorOpen: boolean
  readonly picked: readonly string[]
}

function missingWords({ typed, isAsked, role, isMinorOpen, picked }: Said): string | null {
  const open = [
    ...(typed === '' ? ['the name'] : []),
    ...(isAsked ? ['whether it is somebody known'] : []),
    ...(role === undefined ? ['as what they come'] : []),
    ...(isMinorOpen ? ['whether they are under age'] : []),
    ...(picked.length === 0 ? ['a car'] : []),
  ]
  return open.length === 0 ? null : `Still to say: ${open.join(', ')}.`
}
