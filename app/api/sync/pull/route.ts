import { syncPull } from '@/lib/contracts/sync-pull'
import { handle } from '@/lib/http/server'
import { servePull } from '@/lib/sync/server/serve-pull'

export const GET = handle(syncPull, servePull)
