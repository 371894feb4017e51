import { planBay, seeBayOrder } from '@/lib/contracts/bay-order'
import { handle } from '@/lib/http/server'
import { planOrder } from '@/lib/order/commands/plan-order'
import { seeOrder } from '@/lib/order/queries/see-order'
import { readDoubts } from '@/app/(organiser)/_frame/read-doubts'

export const GET = handle(seeBayOrder, seeOrder(readDoubts))
export const POST = handle(planBay, planOrder(readDoubts))
