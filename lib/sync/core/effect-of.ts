import type { KnownRecord, RecordKind } from '@/lib/inspection/record'

type Effect = 'stops' | 'permits' | 'none'

/** Just enough of a record or draft to know its effect. */
export type EffectInput =
  | { readonly kind: Exclude<RecordKind, 'finding' | 'ruling' | 'entry-changed'> }
  | { readonly kind: 'finding' | 'ruling'; readonly outcome: string }
  | { readonly kind: 'entry-changed'; readonly change: { readonly what: string } }

const BY_KIND: Readonly<Record<Exclude<RecordKind, 'finding' | 'ruling' | 'entry-changed'>, Effect>> = {
  presented: 'none',
  dispensation: 'permits',
  pass: 'permits',
  band: 'permits',
  void: 'stops',
  hold: 'stops',
  lifted: 'permits',
  recall: 'stops',
  day: 'stops',
  adopted: 'none',
  incident: 'none',
  comment: 'none',
}

/** What a record does to a subject, by its kind and outcome: what builds that do not know the kind obey (rule T3). */
export function effectOf(record: EffectInput | KnownRecord): Effect {
  if (record.kind === 'finding' || record.kind === 'ruling')
    return record.outcome === 'ok' || record.outcome === 'advisory' ? 'permits' : 'stops'
  if (record.kind !== 'entry-changed') return BY_KIND[record.kind]
  if (record.change.what === 'withdrawn') return 'stops'
  return record.change.what === 'returned' ? 'permits' : 'none'
}
