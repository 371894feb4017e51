import 'server-only'
import type { Db } from '@/db/client'
import type { Auth, Contract, InputOf, OutputOf } from '@/lib/contracts/contract'
import type { AccountActor, Actor, DeviceActor, Nobody } from './actor'
import type { Refusal } from './refusal'

/** What a command gets from outside besides its input. Ask only for the parts you read: `Pick<Deps, 'database' | 'now'>`. */
export interface Deps {
  readonly database: Db
  /** The instant of this request, ms UTC; one for all it does. */
  readonly now: number
  /** The configured origin, for links. */
  readonly origin: string
  readonly userAgent: string
  /** The request's cookie header; only signing out needs it. */
  readonly cookie: string
  /** Headers to send with a success, such as a cookie. */
  readonly replyHeaders: Headers
  /** Aborted when the asker has gone. */
  readonly signal: AbortSignal
}

export type ActorFor<A extends Auth> = {
  readonly public: AccountActor | Nobody
  readonly session: AccountActor
  readonly device: DeviceActor
  readonly either: AccountActor | DeviceActor
}[A]

/**
 * A feature's answer to a contract: parsed input, the actor (already allowed the contract's action), and deps; gives the response or a refusal.
 * It still has to look whether the object is the actor's own (`clubId`, event): a foreign one is answered `missing`, as one that never was.
 */
export type Command<C extends Contract> = (
  input: InputOf<C>,
  actor: ActorFor<C['auth']>,
  deps: Deps,
) => OutputOf<C> | Refusal | Promise<OutputOf<C> | Refusal>

/** A stream: each yield is one event of the contract's response shape. It must end when `deps.signal` aborts (`changesOf` in ./live does). */
export type StreamCommand<C extends Contract> = (
  input: InputOf<C>,
  actor: ActorFor<C['auth']>,
  deps: Deps,
) => AsyncIterable<OutputOf<C>> | Refusal | Promise<AsyncIterable<OutputOf<C>> | Refusal>

/** An upload: the bytes as they came, within the contract's limit and otherwise unlooked at. */
export type UploadCommand<C extends Contract> = (
  input: InputOf<C>,
  bytes: Uint8Array,
  actor: ActorFor<C['auth']>,
  deps: Deps,
) => OutputOf<C> | Refusal | Promise<OutputOf<C> | Refusal>

/** A file to be sent as it is. */
export interface FileAnswer {
  readonly bytes: Uint8Array
  /** Its media type, such as `image/jpeg`; what a browser guesses from the bytes does not count. */
  readonly type: string
  /** Offered under this name to be saved; null: to be shown where it was asked for. */
  readonly saveAs: string | null
  /** Names these very bytes for ever, so that the asker's own browser may keep them a day; null: asked anew each time. */
  readonly etag: string | null
}

/** A download: one file. */
export type DownloadCommand<C extends Contract> = (
  input: InputOf<C>,
  actor: ActorFor<C['auth']>,
  deps: Deps,
) => FileAnswer | Refusal | Promise<FileAnswer | Refusal>

export type { Actor, AccountActor, DeviceActor, Nobody }
