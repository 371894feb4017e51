import type { CrewRole } from '@/lib/permissions/policy'

interface Invitation {
  readonly name: string
  readonly role: CrewRole
  readonly event: string
  readonly by: string
  readonly link: string
  /** The address had no account: they choose a password first. */
  readonly isNew: boolean
}

/** The mail that tells somebody that they are crew. */
export function invitationText({ name, role, event, by, link, isNew }: Invitation): { readonly subject: string; readonly text: string } {
  const how = isNew ? `Choose a password here; the link holds for seven days and once:\n${link}` : `You sign in as always:\n${link}`
  return {
    subject: `${event}: you are ${role}`,
    text: `${name},\n\n${by} has put you down as ${role} for ${event}.\n\n${how}\n\nOn the day, open it where there is signal first: your device loads the day and then works without.\n`,
  }
}
