import type { Metadata } from 'next'
import { EventFrame } from '../../../_frame/event-frame'
import { guardEvent } from '../../../_frame/guard-event'
import { MailScreen } from './_mail/mail-screen'

export const metadata: Metadata = { title: 'Mail' }

export default async function MailPage({ params }: { readonly params: Promise<{ event: string }> }) {
  const guarded = await guardEvent((await params).event, 'mail', 'mail:see')
  const { id, timeZone } = guarded.event
  return (
    <EventFrame guarded={guarded} tab="mail">
      <MailScreen eventId={id} timeZone={timeZone} />
    </EventFrame>
  )
}
