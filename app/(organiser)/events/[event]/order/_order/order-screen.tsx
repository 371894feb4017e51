'use client'

import Link from 'next/link'
import { useState } from 'react'
import { dayWords } from '@/app/_crew/say-when'
import { EmptyState } from '@/app/_ui/empty-state'
import type { BayOrderView } from '@/lib/contracts/bay-order'
import { GroupStaffing } from './group-staffing'
import { PlanForm } from './plan-form'
import { WindowList } from './window-list'

interface OrderScreenProps {
  readonly eventId: string
  readonly first: BayOrderView
  readonly mayPlan: boolean
}

/** Who is called to the bay when, on one day, and how many people that takes. */
export function OrderScreen({ eventId, first, mayPlan }: OrderScreenProps) {
  const [order, setOrder] = useState(first)
  const cars = order.groups.reduce((sum, group) => sum + group.cars, 0)
  return (
    <div className="grid gap-8">
      <Days eventId={eventId} order={order} />
      {cars === 0 ? (
        <EmptyState title="No entries yet">Import the entry list first; each car then gets its window here.</EmptyState>
      ) : (
        <>
          {mayPlan && <PlanForm eventId={eventId} order={order} onOrder={setOrder} />}
          <GroupStaffing order={order} />
          <WindowList order={order} />
        </>
      )}
    </div>
  )
}

function Days({ eventId, order: { day, days } }: { readonly eventId: string; readonly order: BayOrderView }) {
  if (days.length === 1) return <h2 className="text-2xl">{dayWords(day)}</h2>
  return (
    <nav aria-label="Days" className="flex flex-wrap gap-3">
      {days.map((each) => (
        <Link
          key={each}
          href={`/events/${eventId}/order?day=${each}`}
          aria-current={each === day ? 'page' : undefined}
          className="target heading inline-flex items-center border-2 px-4 text-lg text-accent aria-[current=page]:border-ink aria-[current=page]:bg-ink aria-[current=page]:text-ground"
        >
          {dayWords(each)}
        </Link>
      ))}
    </nav>
  )
}
