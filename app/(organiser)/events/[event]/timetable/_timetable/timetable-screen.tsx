'use client'

import { useState } from 'react'
import { dayWords } from '@/app/_crew/say-when'
import type { TimetableView } from '@/lib/events/queries/see-timetable'
import { DayEditor } from './day-editor'
import { DayTable } from './day-table'

interface TimetableScreenProps {
  readonly eventId: string
  readonly timetable: TimetableView
  readonly mayEdit: boolean
}

/** The timetable of each day: written by the organiser, read by everybody of the crew. */
export function TimetableScreen({ eventId, timetable, mayEdit }: TimetableScreenProps) {
  const [byDay, setByDay] = useState(timetable.byDay)
  const { days, groups } = timetable
  return (
    <div className="grid gap-10">
      {days.map((day) => (
        <section key={day} aria-labelledby={`day-${day}`} className="grid gap-3">
          <h2 id={`day-${day}`} className="text-2xl">
            {dayWords(day)}
          </h2>
          {mayEdit ? (
            <DayEditor
              key={JSON.stringify(byDay[day])}
              eventId={eventId}
              day={day}
              groups={groups}
              lines={byDay[day] ?? []}
              others={days
                .filter((other) => other !== day && (byDay[other] ?? []).length > 0)
                .map((other) => ({ day: other, lines: byDay[other] ?? [] }))}
              onSaved={(lines) => setByDay({ ...byDay, [day]: lines })}
            />
          ) : (
            <DayTable groups={groups} lines={byDay[day] ?? []} />
          )}
        </section>
      ))}
    </div>
  )
}
