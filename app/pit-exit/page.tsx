import { connection } from 'next/server'
import { PitExitApp } from './_screens/pit-exit-app'

/**
 * The pit exit's shell: the same for everybody, so that a worker may keep it and answer with it offline.
 * Nothing about a person, an event or a car may be rendered here.
 */
export default async function PitExitPage() {
  await connection() // rendered per request: the policy's nonce is new each time
  return <PitExitApp />
}
