import type { Metadata } from 'next'
import { can } from '@/lib/permissions/policy'
import { EventFrame } from '../../../_frame/event-frame'
import { guardEvent } from '../../../_frame/guard-event'
import { DevicesScreen } from './_devices/devices-screen'

export const metadata: Metadata = { title: 'Devices' }

export default async function DevicesPage({ params }: { readonly params: Promise<{ event: string }> }) {
  const guarded = await guardEvent((await params).event, 'devices', 'crew:see')
  const { event, roles } = guarded
  return (
    <EventFrame guarded={guarded} tab="devices">
      <DevicesScreen eventId={event.id} timeZone={event.timeZone} mayRetire={can(roles, 'device:retire')} />
    </EventFrame>
  )
}
