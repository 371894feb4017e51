import 'server-only'
import type { CrewRole, Role } from '@/lib/permissions/policy'

/** The demo club: invented people at an invented ring. */
export const MARRAM = {
  club: 'Marram Track Days',
  event: 'Marram at the Ottermere Ring',
  venue: 'Ottermere Ring',
  timeZone: 'Europe/London',
  days: 2,
  listStaleMinutes: 30,
  checklist: 'closed-circuit/v2.json',
  limits: 'limits/track-day.json',
  /** On the list it is the entrant's own. */
  entrantNumber: '303',
  entryList: 'tests/fixtures/entries-clean.csv',
  /** For the demo alone: everybody may read it here. */
  password: 'ottermere-ring-demo',
  groups: ['Novice', 'Intermediate', 'Advanced'],
} as const

export interface DemoAccount {
  readonly role: Role
  readonly name: string
  readonly clubRoles: readonly ('admin' | 'organiser' | 'entrant')[]
  readonly crewRole: CrewRole | null
}

export const MARRAM_ACCOUNTS: readonly DemoAccount[] = [
  { role: 'admin', name: 'Petra Holmwood', clubRoles: ['admin'], crewRole: null },
  { role: 'organiser', name: 'Dorian Marsh', clubRoles: ['organiser'], crewRole: null },
  { role: 'chief', name: 'Sella Warrick', clubRoles: [], crewRole: 'chief' },
  { role: 'scrutineer', name: 'Tobin Ashe', clubRoles: [], crewRole: 'scrutineer' },
  { role: 'helper', name: 'Mirel Quay', clubRoles: [], crewRole: 'helper' },
  { role: 'sign-on', name: 'Odile Fenn', clubRoles: [], crewRole: 'sign-on' },
  { role: 'marshal', name: 'Bram Coster', clubRoles: [], crewRole: 'marshal' },
  { role: 'entrant', name: 'Jory Tamsin', clubRoles: ['entrant'], crewRole: null },
]

/** The demo address of a role. */
export function demoEmail(role: Role): string {
  return `${role}@marram.example`
}
