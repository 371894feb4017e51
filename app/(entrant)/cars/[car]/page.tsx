import type { Metadata } from 'next'
import { notFound } from 'next/navigation'
import { carCard } from '@/lib/entrants/queries/car-card'
import { now } from '@/lib/platform/clock'
import { servedDatabase } from '@/lib/platform/served-database'
import { dayReading } from '@/lib/sync/server/day-reading'
import { EntrantFrame } from '../../_frame/entrant-frame'
import { guardEntrant } from '../../_frame/guard-entrant'
import { CarForm } from '../_cars/car-form'

export const metadata: Metadata = { title: 'My car' }

export default async function CarPage({ params }: { readonly params: Promise<{ car: string }> }) {
  const { car } = await params
  const account = await guardEntrant(`/cars/${encodeURIComponent(car)}`)
  const card = carCard(dayReading, servedDatabase(), account, car, now())
  if (card === null) notFound()
  return (
    <EntrantFrame title={card.car.model} subtitle={`${card.car.colour} · ${card.car.plate}`} tab="cars">
      <CarForm card={card} />
    </EntrantFrame>
  )
}
