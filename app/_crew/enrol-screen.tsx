'use client'

import { useEffect, useState } from 'react'
import { Button, buttonClass } from '@/app/_ui/button'
import { EmptyState } from '@/app/_ui/empty-state'
import { TextField } from '@/app/_ui/field'
import { Notice } from '@/app/_ui/notice'
import { me } from '@/lib/contracts/me'
import type { Problem } from '@/lib/contracts/problem'
import { call } from '@/lib/http/call'
import { browserStores } from '@/lib/sync/client/browser-stores'
import { enrolHere } from '@/lib/sync/client/enrol-here'
import { dayWords } from './say-when'
import { readClaims } from './read-claims'

/** An event this browser may be enrolled for: by a sign-in, or by the claim of somebody who was accepted. */
interface Chance {
  readonly event: string
  readonly title: string
  readonly as: string
  readonly claim: string | null
}

/** Makes this browser a crew device: its key is made here and never leaves it. Needs the network once. */
export function EnrolScreen({ post }: { readonly post: 'bay' | 'pit-exit' }) {
  const [chances, setChances] = useState<readonly Chance[] | null>(null)
  const [name, setName] = useState('')
  const [busy, setBusy] = useState(false)
  const [problem, setProblem] = useState<Problem | null>(null)
  useEffect(() => {
    let cancelled = false
    void findChances().then((found) => !cancelled && setChances(found))
    return () => {
      cancelled = true
    }
  }, [])

  const enrol = async (chance: Chance) => {
    setBusy(true)
    const request = { event: chance.event, name: name.trim(), ...(chance.claim === null ? {} : { claim: chance.claim }) }
    const outcome = await enrolHere(request, browserStores, Date.now())
    setBusy(false)
    if (!outcome.ok) { setProblem(outcome.problem); return; }
    // A fresh page opens the device's own store from the start.
    window.location.reload()
  }

  if (chances === null) return <p className="p-6">Looking for what this device may be …</p>
  return (
    <main className="mx-auto grid w-full max-w-3xl gap-4 p-4">
      <h1 className="text-xl">{post === 'bay' ? 'A device for the bay' : 'A device for the pit exit'}</h1>
      {chances.length === 0 ? (
        <EmptyState
          title="This device is not enrolled yet"
          actions={
            <a className={buttonClass('primary')} href={`/sign-in?next=/${post}`}>
              Sign in
            </a>
          }
        >
          Sign in here if you have an account and are crew of an event, or open the join link the organiser shows you. It needs the network
          this once.
        </EmptyState>
      ) : (
        <form
          className="grid gap-4"
          onSubmit={(event) => {
            event.preventDefault()
            const chance = chances.find((one) => one.event === new FormData(event.currentTarget).get('event'))
            if (chance) void enrol(chance)
          }}
        >
          <fieldset className="grid gap-2">
            <legend className="font-bold">For which event</legend>
            {chances.map((chance, index) => (
              <label key={`${chance.event} ${chance.claim ?? ''}`} className="target flex items-center gap-3 border-t border-line py-2">
                <input type="radio" name="event" value={chance.event} defaultChecked={index === 0} className="size-7 accent-accent" />
                <span>
                  {chance.title}
                  <span className="block text-muted">{chance.as}</span>
                </span>
              </label>
            ))}
          </fieldset>
          <TextField
            label="Name of this device"
            description="As the organiser sees it, such as “tablet, lane 2”."
            name="name"
            value={name}
            onChange={(event) => setName(event.target.value)}
            maxLength={60}
            required
          />
          {problem && <Notice happened={problem.what} kept={problem.kept} todo={problem.todo} />}
          <Button type="submit" size="large" isBusy={busy}>
            Enrol this device
          </Button>
        </form>
      )}
    </main>
  )
}

async function findChances(): Promise<readonly Chance[]> {
  const claims = readClaims(localStorage).map(({ claim, event, role, name, title }): Chance => ({
    event,
    title,
    as: `${name}, ${role}`,
    claim,
  }))
  const signedIn = await call(me, {})
  const crew = ['chief', 'scrutineer', 'helper', 'sign-on', 'marshal', 'organiser']
  const events = signedIn.ok ? signedIn.value.events.filter(({ roles }) => roles.some((role) => crew.includes(role))) : []
  const own = events.map((event): Chance => ({
    event: event.id,
    title: `${event.name}, ${dayWords(event.firstDay)}`,
    as: `${signedIn.ok ? signedIn.value.name : ''}, ${event.roles.filter((role) => crew.includes(role)).join(', ')}`,
    claim: null,
  }))
  return [...claims, ...own]
}
