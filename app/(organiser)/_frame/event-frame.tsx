import type { ReactNode } from 'react'
import { dayWords } from '@/app/_crew/say-when'
import { PageFrame } from '@/app/_ui/page-frame'
import type { GuardedEvent } from './guard-event'
import { type EventTab, EventTabs } from './event-tabs'
import { OfficeBar } from './office-bar'

interface EventFrameProps {
  readonly guarded: GuardedEvent
  readonly tab: EventTab
  readonly width?: 'text' | 'wide' | 'full'
  readonly children: ReactNode
}

/** A page of one event: its name and days above, its tabs, the content. */
export function EventFrame({ guarded: { account, event, roles }, tab, width = 'wide', children }: EventFrameProps) {
  return (
    <PageFrame
      title={event.name}
      subtitle={`${event.venue} · ${daysInWords(event)}`}
      width={width}
      navigation={<OfficeBar name={account.name} />}
    >
      <EventTabs eventId={event.id} current={tab} roles={roles} />
      <div className="pt-6">{children}</div>
    </PageFrame>
  )
}

/** `Sat 9 May 2026`, or `Sat 9 May 2026 to Sun 10 May 2026`. */
export function daysInWords({ firstDay, lastDay }: { readonly firstDay: string; readonly lastDay: string }): string {
  return firstDay === lastDay ? dayWords(firstDay) : `${dayWords(firstDay)} to ${dayWords(lastDay)}`
}
