import type { Metadata } from 'next'
import { notFound } from 'next/navigation'
import { PageFrame } from '@/app/_ui/page-frame'
import { can } from '@/lib/permissions/policy'
import { guardAccount } from '../../_frame/guard-event'
import { OfficeBar } from '../../_frame/office-bar'
import { NewEventForm } from './_new/new-event-form'

export const metadata: Metadata = { title: 'New event' }

export default async function NewEventPage() {
  const account = await guardAccount('/events/new')
  if (!can(account.clubRoles, 'event:edit')) notFound()
  return (
    <PageFrame title="New event" width="text" navigation={<OfficeBar name={account.name} />}>
      <NewEventForm />
    </PageFrame>
  )
}
