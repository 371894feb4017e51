import { enrolDevice } from '@/lib/contracts/devices'
import { enrol } from '@/lib/devices/commands/enrol'
import { handle } from '@/lib/http/server'

export const POST = handle(enrolDevice, enrol)
