'use client'

import { useArrival } from '@/app/_crew/use-arrival'
import { ProblemNotice } from '@/app/_crew/problem-notice'
import { goTo } from '@/app/_crew/use-location'
import { Button } from '@/app/_ui/button'
import { Notice } from '@/app/_ui/notice'
import { OneOf } from '@/app/_walk/one-of'
import { can } from '@/lib/permissions/policy'
import { useDayStatus } from '@/lib/sync/client/use-day'
import { CarPicks } from './car-picks'
import { useTurnedUp } from './use-turned-up'
import type { Desk } from './use-desk'

const ROLES = [
  { value: 'passenger', label: 'Passenger' },
  { value: 'instructor', label: 'Instructor' },
  { value: 'driver', label: 'Driver' },
] as const
const YES_NO = [
  { value: true, label: 'Yes' },
  { value: false, label: 'No' },
] as const

/** Somebody on no list: who they are, as what they come, and the cars they sit in. Works with the network off; other devices learn of it when both have heard from the server. */
export function TurnedUpScreen({ desk }: { readonly desk: Desk }) {
  const heading = useArrival<HTMLHeadingElement>('turned-up')
  const { unlocked } = useDayStatus(desk.day)
  const now = useTurnedUp(desk)
  if (!can(unlocked?.roles ?? [], 'record:entry-people-changed'))
    return (
      <main>
        <Notice
          happened="Whoever is unlocked here may not put anybody into a car."
          kept="Nothing was changed."
          todo="Sign-on, the chief or the organiser does it; hand the device over, or ask them."
          actions={<Button onClick={() => goTo('/sign-on')}>Back to sign-on</Button>}
          className="m-4"
        />
      </main>
    )
  return (
    <main className="grid grid-cols-[minmax(0,1fr)] gap-4 px-4 pt-4 pb-6">
      <h1 ref={heading} tabIndex={-1} className="text-xl outline-none">
        Somebody turned up
      </h1>
      <form
        className="grid grid-cols-[minmax(0,1fr)] gap-4"
        onSubmit={(event) => {
          event.preventDefault()
          now.save()
        }}
      >
        <label className="grid gap-1">
          <span className="font-bold">First and last name</span>
          <input
            className="target-outcome w-full rounded-sm border border-line bg-ground px-4 text-2xl"
            value={now.name}
            maxLength={120}
            required
            autoComplete="off"
            onChange={(event) => now.setName(event.target.value)}
          />
        </label>
        {now.alike.length > 0 && (
          <OneOf
            name="same"
            label="Somebody of this name is known. Is it them?"
            options={[...now.alike.map(({ id, words }) => ({ value: id, label: words })), { value: 'new', label: 'No, somebody new' }]}
            value={now.same}
            onPick={now.setSame}
            isStrong
          />
        )}
        <OneOf name="role" label="Comes as" options={ROLES} value={now.role} onPick={now.setRole} isStrong />
        {now.isNew && <OneOf name="minor" label="Under age" options={YES_NO} value={now.minor} onPick={now.setMinor} isStrong />}
        <CarPicks entries={now.entries} picked={now.cars} onPicked={now.setCars} />
        <ProblemNotice problem={now.problem} />
        {now.missing !== null && <p className="text-muted">{now.missing}</p>}
        <Button type="submit" size="large" isBusy={now.busy} disabled={now.missing !== null}>
          {now.cars.length > 1 ? `Put into ${now.cars.length} cars` : 'Put into the car'}
        </Button>
      </form>
      <Button look="quiet" className="justify-self-start" onClick={() => goTo('/sign-on')}>
        Back to sign-on
      </Button>
    </main>
  )
}
