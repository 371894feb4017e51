import type { Figures } from '@/lib/contracts/declaration'
import type { Typed } from '@/lib/walk/read-values'

/** Kept values as a form shows them. */
export function typedOf(values: Figures): Typed {
  return Object.fromEntries(Object.entries(values).map(([field, value]) => [field, value === null ? '' : String(value)]))
}
