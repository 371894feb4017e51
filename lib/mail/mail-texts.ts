import type { Verdict } from '@/lib/inspection/state'
import { civilDate } from '@/lib/rules/civil-date'
import { dateInWords } from '@/lib/rules/date-in-words'
import type { PreCheckRow } from './mail-readers'

export interface MailText {
  readonly subject: string
  readonly text: string
}

/** What every mail of an event says of it. */
export interface MailEvent {
  readonly name: string
  readonly venue: string
  readonly firstDay: string
  readonly lastDay: string
}

export interface MailEntry {
  readonly number: string
  readonly model: string
}

/** The link that lets a person of the entry in. */
export function invitationText(event: MailEvent, entry: MailEntry, name: string, link: string): MailText {
  return {
    subject: `${event.name}: declare your car ${entry.number}`,
    text: mail([
      `Hello ${name},`,
      `you are entered with number ${entry.number}, ${entry.model}, for ${event.name} (${event.venue}, ${daysOf(event)}).`,
      `Open your entry here:\n${link}`,
      'Please declare your car, your belts and your kit there before you travel. Each answer is judged at once by the rules the bay uses, so that nothing surprises you on the day. Have the labels of your belts and your helmet at hand.',
      'The link is yours alone. Whoever has it can sign for you, so do not pass it on.',
    ]),
  }
}

/** For who has signed no declaration yet. */
export function reminderText(event: MailEvent, entry: MailEntry, name: string, link: string): MailText {
  return {
    subject: `${event.name}: car ${entry.number} is not declared yet`,
    text: mail([
      `Hello ${name},`,
      `nothing has been declared for number ${entry.number}, ${entry.model}. ${event.name} is on ${daysOf(event)}.`,
      `It takes a few minutes, here:\n${link}`,
      'A car that is declared is seen sooner and needs less time in the bay. One that is not is seen all the same, and takes longer.',
    ]),
  }
}

/** What would not be passed, to who can still put it right at home. */
export function wouldNotBePassedText(event: MailEvent, row: PreCheckRow, name: string, link: string): MailText {
  return {
    subject: `${event.name}: car ${row.number} would not be passed as declared`,
    text: mail([
      `Hello ${name},`,
      `as you declared it, number ${row.number}, ${row.model}, would not be passed at ${event.venue} on ${daysOf(event)}:`,
      linesOf(row, 'fail'),
      ...(has(row, 'advisory') ? [`This will be looked at:\n${linesOf(row, 'advisory')}`] : []),
      `There is time to put it right. What you have changed, declare here:\n${link}`,
      'This is what the rules make of your own words. The scrutineer decides at the car.',
    ]),
  }
}

/** The same for the organiser, of all entries. */
export function wouldNotBePassedListText(event: MailEvent, rows: readonly PreCheckRow[], entries: number, link: string): MailText {
  const declared = rows.filter(({ version }) => version !== null).length
  const worrying = rows.filter((row) => has(row, 'fail'))
  return {
    subject: `${event.name}: ${worrying.length} of ${declared} declared cars would not be passed`,
    text: mail([
      `${event.name}, ${event.venue}, ${daysOf(event)}: ${entries} entries, ${declared} declared, ${entries - declared} not.`,
      worrying.length === 0
        ? 'As declared, none of them would be refused.'
        : worrying.map((row) => `${row.number}, ${row.model}, ${row.drivers.join(' and ')}\n${linesOf(row, 'fail')}`).join('\n\n'),
      'Each of them with an address is told by mail as well.',
      link,
    ]),
  }
}

/** How the car stood. */
export function resultText(event: MailEvent, entry: MailEntry, name: string, verdict: Verdict, open: readonly string[]): MailText {
  return {
    subject: `${event.name}: car ${entry.number}, ${verdict}`,
    text: mail([
      `Hello ${name},`,
      `number ${entry.number}, ${entry.model}, at ${event.name}: ${verdict}.`,
      ...(open.length === 0
        ? []
        : [`What stands open, so that it can be put right before the next time:\n${open.map((line) => `- ${line}`).join('\n')}`]),
      'This says what was seen on that day without taking the car apart. It is no certificate and no warranty, and it is worth nothing for another day.',
    ]),
  }
}

function mail(parts: readonly string[]): string {
  return `${parts.join('\n\n')}\n`
}

function has({ worries }: PreCheckRow, weight: 'fail' | 'advisory'): boolean {
  return worries.some((worry) => worry.weight === weight)
}

function linesOf({ worries }: PreCheckRow, weight: 'fail' | 'advisory'): string {
  return worries
    .filter((worry) => worry.weight === weight)
    .map(({ prompt, words }) => `- ${prompt}: ${words}`)
    .join('\n')
}

function daysOf({ firstDay, lastDay }: MailEvent): string {
  const first = dateInWords(civilDate(firstDay))
  return firstDay === lastDay ? first : `${first} to ${dateInWords(civilDate(lastDay))}`
}
