'use client'

import { createContext, useContext, type ReactNode } from 'react'
import type { DayClient } from '@/lib/sync/client/day-client'

const DayContext = createContext<DayClient | null>(null)

/** Gives the screens below it the day this device carries. */
export function DayProvider({ client, children }: { readonly client: DayClient; readonly children: ReactNode }) {
  return <DayContext value={client}>{children}</DayContext>
}

/** The day client; only below the crew gate, which shows nothing before there is one. */
export function useDay(): DayClient {
  const client = useContext(DayContext)
  if (client === null) throw new Error('a crew screen stands outside the crew gate')
  return client
}
