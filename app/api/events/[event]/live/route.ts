import { live } from '@/lib/contracts/live'
import { handleStream } from '@/lib/http/stream'
import { watchEvent } from '@/lib/sync/server/watch-event'

export const GET = handleStream(live, watchEvent)
