import { redirect } from 'next/navigation'

export default async function EventPage({ params }: { readonly params: Promise<{ event: string }> }) {
  const { event } = await params
  redirect(`/events/${encodeURIComponent(event)}/board`)
}
