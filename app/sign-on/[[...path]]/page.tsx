import { connection } from 'next/server'
import { SignOnApp } from '../_screens/sign-on-app'

/**
 * The desk's shell: the same for everybody and every address under /sign-on, so that a worker may keep it and answer with it offline.
 * Nothing about a person, an event or a car may be rendered here; the place is read from the address in the browser.
 */
export default async function SignOnPage() {
  await connection() // rendered per request: the policy's nonce is new each time
  return <SignOnApp />
}
