'use client'

import { clockTime, ago } from '@/app/_crew/say-when'
import { Sheet } from '@/app/_ui/sheet'
import { listAge } from '@/lib/pass/list-age'
import type { PassList } from '@/lib/pass/pass-list'
import type { PitDevice } from '@/lib/pass/pit-device'
import { readBackOf } from '@/lib/pass/read-back'
import type { HeardReadBack } from './pit-memory'
import { ReadBackForm } from './read-back-form'

interface ListSheetProps {
  readonly isOpen: boolean
  readonly list: PassList | null
  readonly device: PitDevice
  readonly onHeard: (heard: HeardReadBack) => void
  readonly onClose: () => void
}

/** The list this device goes by: how old it is, what to read out of it on the radio, and what was heard. */
export function ListSheet({ isOpen, list, device, onHeard, onClose }: ListSheetProps) {
  const own = list && readBackOf(list)
  return (
    <Sheet isOpen={isOpen} title={list ? `List ${list.version}` : 'No list'} onClose={onClose}>
      <div className="grid gap-4">
        {list && own && (
          <>
            <p>
              Made at {clockTime(list.at, device.timeZone)}, {ago(listAge(list, device))}. It comes by itself where there is signal. After{' '}
              {device.listStaleMinutes} min every car is CHECK.
            </p>
            <section className="grid gap-1">
              <h3 className="text-lg">To read out from this list</h3>
              <p className="text-xl font-bold">
                {own.numbers.length === 0 ? 'No holds' : `Holds ${own.numbers.join(', ')}`}; {own.livePasses} live passes.
              </p>
            </section>
          </>
        )}
        <ReadBackForm list={list} device={device} onHeard={onHeard} />
      </div>
    </Sheet>
  )
}
