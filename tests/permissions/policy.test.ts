import { expect, test } from 'vitest'
import { type Action, can, POLICY, type Role, ROLES } from '@/lib/permissions/policy'

// Written by hand from PRODUCT and SYNC, not from the table: it must be able to disagree.
// One column a role:   admin organiser chief scrutineer helper sign-on marshal entrant
const MATRIX: Readonly<Record<Action, string>> = {
  'event:see': '            yes   yes       yes   yes        yes    yes     yes     no',
  'event:edit': '           yes   yes       no    no         no     no      no      no',
  'entry:own': '            no    no        no    no         no     no      no      yes',
  'garage:keep': '          no    no        no    no         no     no      no      yes',
  'entries:edit': '         no    yes       yes   no         no     no      no      no',
  'entries:import': '       yes   yes       no    no         no     no      no      no',
  'entries:see': '          yes   yes       yes   no         no     no      no      no',
  'holds:see': '            yes   yes       yes   no         no     no      no      no',
  'board:see': '            yes   yes       yes   yes        yes    yes     yes     no',
  'contacts:see': '         yes   yes       no    no         no     no      no      no',
  'report:see': '           yes   yes       yes   no         no     no      no      no',
  'order:see': '            yes   yes       yes   yes        yes    yes     no      no',
  'order:plan': '           yes   yes       no    no         no     no      no      no',
  'crew:accept': '          yes   yes       no    no         no     no      no      no',
  'crew:see': '             yes   yes       yes   no         no     no      no      no',
  'join-code:make': '       yes   yes       no    no         no     no      no      no',
  'device:enrol': '         no    yes       yes   yes        yes    yes     yes     no',
  'device:retire': '        yes   yes       no    no         no     no      no      no',
  'day:load': '             no    yes       yes   yes        yes    yes     yes     no',
  'mail:see': '             yes   yes       no    no         no     no      no      no',
  'mail:send': '            yes   yes       no    no         no     no      no      no',
  'photo:put': '            yes   yes       yes   yes        yes    yes     yes     yes',
  'photo:see': '            yes   yes       yes   yes        yes    yes     yes     no',
  'record:presented': '     no    no        yes   yes        yes    yes     yes     no',
  'record:presented-lowering': 'no no       yes   yes        no     no      no      no',
  'record:finding-permits': 'no   no        yes   yes        no     yes     no      no',
  'record:finding-advisory': 'no  no        yes   yes        yes    yes     no      no',
  'record:finding-stops': ' no    no        yes   yes        yes    yes     no      no',
  'record:ruling': '        no    no        yes   no         no     no      no      no',
  'record:dispensation': '  no    no        yes   no         no     no      no      no',
  'record:pass': '          no    no        yes   yes        no     no      no      no',
  'record:band': '          no    no        yes   yes        no     yes     no      no',
  'record:void': '          no    yes       yes   no         no     no      no      no',
  'record:hold': '          no    yes       yes   yes        yes    yes     yes     no',
  'record:lifted': '        no    no        yes   no         no     no      no      no',
  'record:recall': '        no    no        yes   yes        no     no      no      no',
  'record:day': '           no    yes       yes   no         no     no      yes     no',
  'record:entry-changed': ' no    yes       yes   no         no     no      no      no',
  'record:entry-people-changed': 'no yes    yes   no         no     yes     no      no',
  'record:adopted': '       no    no        yes   no         no     no      no      no',
  'record:incident': '      no    yes       yes   yes        yes    yes     yes     no',
  'record:comment': '       no    yes       yes   yes        yes    yes     yes     no',
}

const cells = Object.entries(MATRIX).flatMap(([action, line]) =>
  line
    .trim()
    .split(/\s+/)
    .map((word, column) => ({ action: action as Action, role: ROLES[column] as Role, allowed: word === 'yes' })),
)

test('the matrix names every action and every role', () => {
  expect(Object.keys(MATRIX).sort()).toEqual(Object.keys(POLICY).sort())
  expect(cells).toHaveLength(Object.keys(POLICY).length * ROLES.length)
})

test.each(cells)('$role, $action: $allowed', ({ role, action, allowed }) => {
  expect(can([role], action)).toBe(allowed)
})

test('nobody may do anything', () => {
  expect(Object.keys(POLICY).filter((action) => can([], action as Action))).toEqual([])
})

test('somebody with two roles may do what either may', () => {
  expect(can(['marshal', 'sign-on'], 'record:band')).toBe(true)
  expect(can(['marshal', 'helper'], 'record:pass')).toBe(false)
})
