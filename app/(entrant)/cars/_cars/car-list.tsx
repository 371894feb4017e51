import Link from 'next/link'
import { EmptyState } from '@/app/_ui/empty-state'
import type { Book } from '@/lib/checklist/book'
import type { MyCar } from '@/lib/entrants/queries/my-garage'

/** One's cars, each with what is known of it in a line. */
export function CarList({ cars, book }: { readonly cars: readonly MyCar[]; readonly book: Book | null }) {
  return (
    <section aria-labelledby="cars">
      <h2 id="cars" className="text-xl">
        Cars
      </h2>
      {cars.length === 0 ? (
        <div className="mt-2">
          <EmptyState title="No car yet">
            A car becomes yours when you declare it, or add it here. What you say of it is kept for next time.
          </EmptyState>
        </div>
      ) : (
        <ul className="mt-2 grid gap-3">
          {cars.map((car) => (
            <li key={car.id}>
              <Link href={`/cars/${car.id}`} className="grid border-2 p-3 active:bg-surface">
                <strong className="text-lg">{car.model}</strong>
                <span>
                  {car.colour} · <span className="serial">{car.plate}</span>
                </span>
                <span className="text-muted">{knownOf(car, book)}</span>
              </Link>
            </li>
          ))}
        </ul>
      )}
    </section>
  )
}

function knownOf({ facts }: MyCar, book: Book | null): string {
  const words = (book?.checklist.facts ?? []).flatMap(({ name, label, values }) => {
    const said = values.find(({ value }) => value === facts[name])
    return said ? [`${label}: ${said.label.toLowerCase()}`] : []
  })
  return words.length === 0 ? 'Nothing is known of it yet.' : words.slice(0, 4).join(' · ')
}
