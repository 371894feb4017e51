import type { Metadata } from 'next'
import { notFound } from 'next/navigation'
import { readOrder } from '@/lib/order/queries/see-order'
import { can } from '@/lib/permissions/policy'
import { now } from '@/lib/platform/clock'
import { servedDatabase } from '@/lib/platform/served-database'
import { EventFrame } from '../../../_frame/event-frame'
import { guardEvent } from '../../../_frame/guard-event'
import { readDoubts } from '../../../_frame/read-doubts'
import { OrderScreen } from './_order/order-screen'

export const metadata: Metadata = { title: 'Bay order' }

interface OrderPageProps {
  readonly params: Promise<{ event: string }>
  readonly searchParams: Promise<{ day?: string | string[] }>
}

export default async function OrderPage({ params, searchParams }: OrderPageProps) {
  const guarded = await guardEvent((await params).event, 'order', 'order:see')
  const { day } = await searchParams
  const order = readOrder(readDoubts, servedDatabase(), guarded.event, typeof day === 'string' ? day : null, now())
  if (order === null) notFound()
  return (
    <EventFrame guarded={guarded} tab="order">
      <OrderScreen key={order.day} eventId={guarded.event.id} first={order} mayPlan={can(guarded.roles, 'order:plan')} />
    </EventFrame>
  )
}
