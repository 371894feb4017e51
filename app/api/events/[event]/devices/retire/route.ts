import { retireDevice } from '@/lib/contracts/devices'
import { takeOutOfUse } from '@/lib/devices/commands/take-out-of-use'
import { handle } from '@/lib/http/server'

export const POST = handle(retireDevice, takeOutOfUse)
