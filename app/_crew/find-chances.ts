import { me } from '@/lib/contracts/me'
import { call } from '@/lib/http/call'
import { readClaims } from './read-claims'
import { dayWords } from './say-when'

/** An event this browser may be enrolled for: by a sign-in, or by the claim of somebody who was accepted. */
export interface Chance {
  readonly event: string
  readonly title: string
  readonly as: string
  readonly claim: string | null
}

const CREW: readonly string[] = ['chief', 'scrutineer', 'helper', 'sign-on', 'marshal', 'organiser']

/** What this browser may be enrolled for: the claims on this phone first, then the events of whoever is signed in. */
export async function findChances(): Promise<readonly Chance[]> {
  const claims = readClaims(localStorage).map(({ claim, event, role, name, title }) => ({ event, title, as: `${name}, ${role}`, claim }))
  const signedIn = await call(me, {})
  if (!signedIn.ok) return claims
  const { name, events } = signedIn.value
  const own = events.flatMap((event) => {
    const roles = event.roles.filter((role) => CREW.includes(role))
    const title = `${event.name}, ${dayWords(event.firstDay)}`
    return roles.length === 0 ? [] : [{ event: event.id, title, as: `${name}, ${roles.join(', ')}`, claim: null }]
  })
  return [...claims, ...own]
}
