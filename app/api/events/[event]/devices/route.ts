import { listDevices } from '@/lib/contracts/devices'
import { seeDevices } from '@/lib/devices/queries/see-devices'
import { handle } from '@/lib/http/server'

export const GET = handle(listDevices, seeDevices)
