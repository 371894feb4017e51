/**
 * Photographs of one event on one device. They lie in a store of their own, are kept before any record names them, travel after the records and
 * never make one wait (rules M1, S9). A photograph is sent once a record of this device names it; one that none names within a day goes.
 */
export interface DayPhotos {
  /**
   * Keeps one on the disk; resolves once it is there. `hash` is the SHA-256 of exactly these bytes, and what a finding's `photos` names.
   * Rejects with a `DayError` (`no-room-for-photo`, `storage-failed`); then it was not kept. One that the server has makes room for it.
   */
  readonly keep: (photo: DayPhoto) => Promise<void>
  /** Takes one away again that no record names yet; nothing happens to one that is named. */
  readonly drop: (hash: string) => Promise<void>
  /** The picture: from this device, else from the server; null where neither has it or nothing answers. */
  readonly read: (hash: string) => Promise<Blob | null>
  /** Sends what waits, one after the other; gives how many arrived. Never rejects. For tests and for who wants to wait; the loop does it by itself. */
  readonly send: () => Promise<number>
}

export interface DayPhoto {
  readonly hash: string
  /** A JPEG. */
  readonly bytes: Uint8Array<ArrayBuffer>
}

/** What the device knows of one that it keeps; the bytes lie under a key of their own, so that counting never reads them. */
export interface KeptPhoto {
  readonly hash: string
  readonly size: number
  /** Device clock, ms. */
  readonly keptAt: number
  readonly state: 'waits' | 'sent' | 'refused'
  /** Why the server would not take it; null unless refused. */
  readonly code: string | null
}
