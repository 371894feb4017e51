import { eq } from 'drizzle-orm'
import * as tables from '@/db/schema'
import type { Checklist } from '@/lib/checklist/checklist'
import { hashJson } from '@/lib/checklist/hash'
import { paddockChecklist } from './paddock-book'
import type { SyncPaddock } from './sync-paddock'

type Definition = Checklist['checks'][number]

function aPaper(id: string, given: Partial<Definition> = {}): Definition {
  return {
    id: `papers.${id}`,
    subject: 'person',
    station: 'papers',
    place: 'papers',
    prompt: `${id} seen`,
    how: 'read it',
    short: id,
    critical: false,
    standing: false,
    depth: 'look-over',
    required: true,
    reasons: [
      { id: 'none', text: 'None' },
      { id: 'other', text: 'Anything else I do not like' },
    ],
    reopens: [],
    ...given,
  }
}

/** The small checklist of the tests with what a sign-on desk sees: papers, a briefing, and a consent of who is under age. */
export const deskChecklist: Checklist = {
  ...paddockChecklist,
  id: 'desk',
  facts: [
    ...paddockChecklist.facts,
    {
      name: 'minor',
      subject: 'person',
      label: 'Under age',
      values: [
        { value: true, label: 'Yes' },
        { value: false, label: 'No' },
      ],
    },
  ],
  stations: [...paddockChecklist.stations, { id: 'papers', title: 'Papers', short: 'papers', subject: 'person' }],
  places: [{ id: 'papers', title: 'Papers', subject: 'person', stand: 'At the desk' }, ...paddockChecklist.places],
  checks: [
    ...paddockChecklist.checks,
    aPaper('licence'),
    aPaper('indemnity'),
    aPaper('briefing'),
    aPaper('consent', { applies: { fact: 'minor', is: true }, naMeans: 'Of age' }),
  ],
}
export const DESK_HASH = hashJson(deskChecklist)

/** Puts the desk's checklist in force at the paddock's event. */
export function layOutDesk(paddock: SyncPaddock): void {
  paddock.change((database) => {
    database
      .insert(tables.checklistText)
      .values({ hash: DESK_HASH, body: JSON.stringify(deskChecklist) })
      .run()
    database.update(tables.event).set({ checklistHash: DESK_HASH }).where(eq(tables.event.id, paddock.event)).run()
  })
}
