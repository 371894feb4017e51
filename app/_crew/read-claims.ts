/** What the join page keeps on the phone until it is enrolled: the claim, told once, and what it is for. */
export interface KeptClaim {
  readonly claim: string
  readonly event: string
  readonly role: string
  readonly name: string
  /** The event's name and day, for the list. */
  readonly title: string
}

const PREFIX = 'lockwire.claim.'

export function keepClaim(store: Storage, claim: KeptClaim): void {
  store.setItem(`${PREFIX}${claim.event}`, JSON.stringify(claim))
}

/** Every claim on this phone; one that cannot be read is left out. */
export function readClaims(store: Storage): readonly KeptClaim[] {
  const keys = Array.from({ length: store.length }, (_, index) => store.key(index)).filter((key) => key?.startsWith(PREFIX) === true)
  return keys.flatMap((key) => {
    try {
      const value: unknown = JSON.parse(store.getItem(key ?? '') ?? 'null')
      return isClaim(value) ? [value] : []
    } catch {
      return []
    }
  })
}

function isClaim(value: unknown): value is KeptClaim {
  if (typeof value !== 'object' || value === null) return false
  const fields = value as Record<string, unknown>
  return ['claim', 'event', 'role', 'name', 'title'].every((field) => typeof fields[field] === 'string')
}
