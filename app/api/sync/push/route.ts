import { syncPush } from '@/lib/contracts/sync-push'
import { handle } from '@/lib/http/server'
import { acceptPush } from '@/lib/sync/server/accept-push'

export const POST = handle(syncPush, acceptPush)
