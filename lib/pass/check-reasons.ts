import { isStale, listAge } from './list-age'
import type { PitReason } from './pit-answer'
import { ANY_GROUP, type PitDevice } from './pit-device'
import type { PitFound } from './pit-found'
import { nameWithBand, peopleAboard } from './pit-people'

/** A list made this much after the device's clock says that the clock is wrong, ms. */
const CLOCK_TOLERANCE_MS = 2 * 60_000

/** All that says CHECK of a car that nothing holds (rule P3, and of P8 what a look at the wrist settles). */
export function checkReasons(found: PitFound, device: PitDevice): readonly PitReason[] {
  return [...ofList(found, device), ...ofPass(found), ...ofGroup(found, device), ...ofPeople(found, device)]
}

const ASK = 'Ask on the radio: list, holds?'

function ofList({ list }: PitFound, device: PitDevice): readonly PitReason[] {
  const reasons: PitReason[] = []
  const age = listAge(list, device)
  if (isStale(list, device)) {
    const minutes = Math.floor(age / 60_000)
    const old = Number.isFinite(minutes) ? `List ${list.version} is ${minutes} min old.` : `How old list ${list.version} is cannot be told.`
    reasons.push({ code: 'list-stale', why: [old], todo: ASK })
  }
  if (list.day !== device.day)
    reasons.push({ code: 'list-other-day', why: [`List ${list.version} was made on another day.`], todo: 'Pull the list.' })
  if (device.clockWentBackwards || age < -CLOCK_TOLERANCE_MS)
    reasons.push({
      code: 'clock',
      why: ['This device’s clock went backwards: how old its list is cannot be told.'],
      todo: 'Set the clock and pull the list, or ask on the radio.',
    })
  return reasons
}

function ofPass({ list, listed, scanned }: PitFound): readonly PitReason[] {
  const reasons: PitReason[] = []
  if (!listed) {
    const key = list.keys.find(({ kid }) => kid === scanned?.payload.kid)
    const signer = key?.state === 'lost' ? ' Its device was reported lost.' : key?.state === 'retired' ? ' Its device was retired.' : ''
    reasons.push({
      code: 'not-on-list',
      why: [`Signature good, but this pass is not on list ${list.version}.${signer}`],
      todo: 'Pull the list, or ask the bay by radio.',
    })
  }
  const conditions = listed?.conditions ?? []
  if (conditions.length > 0 || scanned?.payload.conditions)
    reasons.push({
      code: 'conditions',
      why: conditions.length > 0 ? conditions.map((words) => `Only with: ${words}`) : ['It runs under conditions: ask the bay which.'],
      todo: 'See that the conditions are kept.',
    })
  return reasons
}

function ofGroup({ entry, list }: PitFound, { runningGroup }: PitDevice): readonly PitReason[] {
  if (runningGroup === ANY_GROUP || runningGroup === entry.group) return []
  if (runningGroup === null) {
    const isOnly = list.entries.every(({ group }) => group === entry.group)
    return isOnly ? [] : [{ code: 'no-group-set', why: ['Nobody has set which group is running.'], todo: 'Set “now running”.' }]
  }
  const why = entry.groupName === '' ? 'It is of another group than the one running.' : `Group ${entry.groupName}; another one is running.`
  return [{ code: 'other-group', why: [why], todo: 'Send it back if it is not its turn.' }]
}

function ofPeople({ entry }: PitFound, { blocks }: PitDevice): readonly PitReason[] {
  const people = peopleAboard(entry, blocks)
  const barred = people.filter(({ may }) => !may)
  if (barred.length === 0) return []
  const mayGo = people.filter(({ may }) => may).map(nameWithBand)
  const why = [`May go: ${mayGo.join(', ')}`, ...barred.map((person) => `${nameWithBand(person)} may not: ${person.why}`)]
  return [{ code: 'some-may-not', why, todo: 'Read the wrist and tap who is aboard.' }]
}
