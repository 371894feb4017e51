/** Every role there is. A person may hold several: `admin`, `organiser` and `entrant` in the club, the rest per event. */
export const ROLES = ['admin', 'organiser', 'chief', 'scrutineer', 'helper', 'sign-on', 'marshal', 'entrant'] as const
export type Role = (typeof ROLES)[number]

/** The roles that make a crew, and may be had by an event's join code or invitation. */
export const CREW_ROLES = ['chief', 'scrutineer', 'helper', 'sign-on', 'marshal'] as const
export type CrewRole = (typeof CREW_ROLES)[number]

/**
 * Who may do what: the only place it is written. Server, devices and screens all ask `can()`.
 * An action is named `object:act`; record kinds are `record:<kind>`, findings split by what they say.
 */
export const POLICY = {
  'event:see': ['admin', 'organiser', 'chief', 'scrutineer', 'helper', 'sign-on', 'marshal'],
  'event:edit': ['admin', 'organiser'],
  /** One's own: whoever sits in the entry. Whose it is, the command looks. */
  'entry:own': ['entrant'],
  /** What changes about an entry once it has a record is a record: who may make that. */
  'entries:edit': ['organiser', 'chief'],
  'entries:import': ['admin', 'organiser'],
  'entries:see': ['admin', 'organiser', 'chief'],
  'holds:see': ['admin', 'organiser', 'chief'],
  'board:see': ['admin', 'organiser', 'chief', 'scrutineer', 'helper', 'sign-on', 'marshal'],
  /** E-mails and mobiles of people in cars. */
  'contacts:see': ['admin', 'organiser'],
  'report:see': ['admin', 'organiser', 'chief'],
  'order:see': ['admin', 'organiser', 'chief', 'scrutineer', 'helper', 'sign-on'],
  'order:plan': ['admin', 'organiser'],
  'crew:accept': ['admin', 'organiser'],
  'crew:see': ['admin', 'organiser', 'chief'],
  /** One's own cars and kit. */
  'garage:keep': ['entrant'],
  'join-code:make': ['admin', 'organiser'],
  'device:enrol': ['chief', 'scrutineer', 'helper', 'sign-on', 'marshal', 'organiser'],
  'device:retire': ['admin', 'organiser'],
  'day:load': ['chief', 'scrutineer', 'helper', 'sign-on', 'marshal', 'organiser'],
  'mail:see': ['admin', 'organiser'],
  'mail:send': ['admin', 'organiser'],
  'photo:put': ['admin', 'organiser', 'chief', 'scrutineer', 'helper', 'sign-on', 'marshal', 'entrant'],
  /** Another's photograph at an event; one's own is always seen. */
  'photo:see': ['admin', 'organiser', 'chief', 'scrutineer', 'helper', 'sign-on', 'marshal'],
  'record:presented': ['chief', 'scrutineer', 'helper', 'sign-on', 'marshal'],
  /** A `presented` that asks less than the ones before it (rule F12). */
  'record:presented-lowering': ['chief', 'scrutineer'],
  'record:finding-permits': ['chief', 'scrutineer', 'sign-on'],
  'record:finding-advisory': ['chief', 'scrutineer', 'helper', 'sign-on'],
  'record:finding-stops': ['chief', 'scrutineer', 'helper', 'sign-on'],
  'record:ruling': ['chief'],
  'record:dispensation': ['chief'],
  'record:pass': ['chief', 'scrutineer'],
  'record:band': ['chief', 'scrutineer', 'sign-on'],
  'record:void': ['chief', 'organiser'],
  'record:hold': ['chief', 'scrutineer', 'helper', 'sign-on', 'marshal', 'organiser'],
  'record:lifted': ['chief'],
  'record:recall': ['chief', 'scrutineer'],
  'record:day': ['organiser', 'chief', 'marshal'],
  'record:entry-changed': ['organiser', 'chief'],
  'record:entry-people-changed': ['organiser', 'chief', 'sign-on'],
  'record:adopted': ['chief'],
  'record:incident': ['chief', 'scrutineer', 'helper', 'sign-on', 'marshal', 'organiser'],
  'record:comment': ['chief', 'scrutineer', 'helper', 'sign-on', 'marshal', 'organiser'],
} as const satisfies Record<string, readonly Role[]>

export type Action = keyof typeof POLICY

/** Whether somebody with these roles may do this. */
export function can(roles: readonly Role[], action: Action): boolean {
  const allowed: readonly Role[] = POLICY[action]
  return roles.some((role) => allowed.includes(role))
}
