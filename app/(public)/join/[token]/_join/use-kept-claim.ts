'use client'

import { useCallback, useEffect, useState } from 'react'
import { type KeptClaim, keepClaim } from '@/app/_crew/read-claims'

/** Which claim this phone got by this code, so that a reload goes on waiting instead of asking twice. */
const BY_CODE = 'lockwire.joined.'

/** The claim this phone holds by a join code: `undefined` until the browser was asked, null for none. */
export function useKeptClaim(token: string) {
  const [kept, setKept] = useState<KeptClaim | null | undefined>(undefined)
  useEffect(() => {
    setKept(readKept(token)) // eslint-disable-line react-hooks/set-state-in-effect -- storage is there only in the browser, after the first render
  }, [token])

  const keep = useCallback(
    (claim: KeptClaim) => {
      keepClaim(window.localStorage, claim)
      window.localStorage.setItem(`${BY_CODE}${token}`, JSON.stringify(claim))
      setKept(claim)
    },
    [token],
  )
  const forget = useCallback(() => {
    window.localStorage.removeItem(`${BY_CODE}${token}`)
    setKept(null)
  }, [token])
  return { kept, keep, forget }
}

function readKept(token: string): KeptClaim | null {
  try {
    const value = JSON.parse(window.localStorage.getItem(`${BY_CODE}${token}`) ?? 'null') as KeptClaim | null
    return typeof value?.claim === 'string' ? value : null
  } catch (error) {
    // Storage refused or spoiled: as good as nothing kept. Sending then says so.
    if (error instanceof SyntaxError || error instanceof DOMException) return null
    throw error
  }
}
