import type { DayClient } from '@/lib/sync/client/day-client'
import type { Draft, SavedRecord } from '@/lib/sync/client/draft'
import { CHECKLIST_HASH, LIMITS_HASH } from './sync-paddock'

/** First look at a car: what is pinned. */
export function presents(
  day: DayClient,
  car: string,
  facts: Record<string, boolean> = { cage: false, slicks: false },
  depth = 'standard' as const,
) {
  const draft = {
    kind: 'presented',
    subject: { car },
    checklist: CHECKLIST_HASH,
    limits: LIMITS_HASH,
    declaration: null,
    facts,
    depth,
  } as const
  return one(day, draft)
}

/** One finding on a car. Tread is given 6 mm unless said otherwise. */
export function finds(
  day: DayClient,
  car: string,
  check: string,
  outcome: 'ok' | 'advisory' | 'fail' | 'could-not-see' | 'unseen',
  more: object = {},
) {
  return one(day, aFinding(day, car, check, outcome, more))
}

export function aFinding(day: DayClient, car: string, check: string, outcome: string, more: object = {}): Draft {
  const tread = { measured: { depthMm: 6 }, paramsHash: day.book()?.byId.get(check)?.paramsHash ?? undefined }
  return { kind: 'finding', subject: { car }, check, outcome, ...(check === 'wheels.tread' ? tread : {}), ...more } as Draft
}

/** Sees every required check of a car in order, as one action. */
export async function seesAll(day: DayClient, car: string): Promise<readonly SavedRecord[]> {
  const open = day.state(`car:${car}`).open
  return day.record(open.map((check) => aFinding(day, car, check, 'ok')))
}

export async function one(day: DayClient, draft: Draft): Promise<SavedRecord> {
  const [saved] = await day.record([draft])
  return saved
}
