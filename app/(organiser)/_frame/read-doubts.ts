import 'server-only'
import type { BayOrderView } from '@/lib/contracts/bay-order'
import { preChecksOf } from '@/lib/entrants/queries/pre-checks-of'
import type { ReadDoubts } from '@/lib/order/queries/see-order'
import { dayReading } from '@/lib/sync/server/day-reading'

type Doubt = BayOrderView['windows'][number]['cars'][number]['doubt']

/** Which entries are doubtful by what their people declared; a feature never reads another, so it is put together here. */
export const readDoubts: ReadDoubts = (database, own, now) => {
  const book = dayReading(database, own.id, now)?.bookOf(own.checklistHash, own.limitsHash)
  if (!book) return new Map()
  const doubts = new Map<string, Doubt>()
  for (const { entry, version, says } of preChecksOf(database, own, book)) {
    if (version === null) doubts.set(entry, 'not declared')
    else if (says === 'would not be passed' || says === 'not answered') doubts.set(entry, says)
  }
  return doubts
}
