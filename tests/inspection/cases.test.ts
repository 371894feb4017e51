import { describe, expect, test } from 'vitest'
import { foldEvent } from '@/lib/inspection/fold-event'
import { foldSubject } from '@/lib/inspection/fold-subject'
import type { SubjectState } from '@/lib/inspection/state'
import { everyOrder } from '../support/every-order'
import { CAR_KEY, asText, context } from '../support/paddock'
import { FOLD_CASES } from './cases'
import type { Expected } from './fold-case'

function look(state: SubjectState, expected: Expected): void {
  if (expected.verdict) expect(state.verdict).toBe(expected.verdict)
  for (const [check, standing] of Object.entries(expected.standings ?? {}))
    expect([check, state.checks.get(check)?.standing]).toEqual([check, standing])
  for (const [check, heads] of Object.entries(expected.heads ?? {})) {
    expect(state.checks.get(check)?.heads.map(({ hash }) => hash)).toEqual(heads.map(({ hash }) => hash).sort())
  }
  if (expected.disagreements)
    expect([...state.checks.values()].filter((one) => one.disagreement).map((one) => one.check)).toEqual(expected.disagreements)
  for (const [entry, becomes] of expected.passes ?? []) expect(state.passes.find(({ hash }) => hash === entry.hash)?.state).toBe(becomes)
  if (expected.blocks) {
    const blocks = state.blocks.map((block) => `${block.hash} ${block.onlyChiefLifts ? 'only the chief lifts' : 'ends when seen'}`)
    expect(blocks.sort()).toEqual(expected.blocks.map(([entry, how]) => `${entry.hash} ${how}`).sort())
  }
  if (expected.open) expect(state.open).toEqual(expected.open)
  if (expected.defects) {
    expect(state.defectHistory.map(({ check, putRight, undone }) => [check, undone ? 'undone' : putRight ? 'put right' : 'open'])).toEqual(
      expected.defects,
    )
  }
}

describe('the numbered cases, in every order of arrival', () => {
  test.each(FOLD_CASES.map((one) => [`[case ${one.number}] ${one.title}`, one] as const))('%s', (_, { number, build }) => {
    const { records, expected } = build()
    for (const one of expected) {
      const key = one.of ?? CAR_KEY
      const told = context(one.on)
      const first = foldSubject(records, key, told)
      look(first, one)
      for (const order of everyOrder(records, number)) expect(asText(foldSubject(order, key, told))).toBe(asText(first))
      expect(asText(foldEvent(records, told).get(key) as SubjectState)).toBe(asText(first))
    }
  })
})
