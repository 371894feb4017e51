import type { Metadata } from 'next'
import { EventFrame } from '../../../_frame/event-frame'
import { guardEvent } from '../../../_frame/guard-event'
import { ImportScreen } from './_import/import-screen'

export const metadata: Metadata = { title: 'Import' }

export default async function ImportPage({ params }: { readonly params: Promise<{ event: string }> }) {
  const guarded = await guardEvent((await params).event, 'import', 'entries:import')
  return (
    <EventFrame guarded={guarded} tab="import" width="wide">
      <ImportScreen eventId={guarded.event.id} />
    </EventFrame>
  )
}
