import { clockTime } from '@/app/_crew/say-when'
import { DataTable, Td, Th } from '@/app/_ui/data-table'
import type { BayOrderView } from '@/lib/contracts/bay-order'

/** A line a group: what must be through before its first session, and how many people that takes. */
export function GroupStaffing({ order }: { readonly order: BayOrderView }) {
  const { groups, plan, timeZone } = order
  return (
    <div className="grid gap-3">
      <DataTable caption="People it takes">
        <thead>
          <tr>
            <Th>Run group</Th>
            <Th>First session</Th>
            <Th className="text-right">Cars</Th>
            <Th className="text-right">Doubtful</Th>
            <Th className="text-right">Through by then</Th>
            <Th className="text-right">Working minutes</Th>
            <Th className="text-right">People at least</Th>
            <Th className="text-right">For 95 %</Th>
          </tr>
        </thead>
        <tbody>
          {groups.map((group) => (
            <tr key={group.id}>
              <Th scope="row">{group.name}</Th>
              <Td>{group.firstSessionAt === null ? 'no session in the timetable' : clockTime(group.firstSessionAt, timeZone)}</Td>
              <Td isNumber>{group.cars}</Td>
              <Td isNumber>{group.doubtful}</Td>
              <Td isNumber>{group.carsBefore}</Td>
              <Td isNumber>{group.workingMin ?? 'not known'}</Td>
              <Td isNumber>{peopleWords(group.peopleAtLeast, group)}</Td>
              <Td isNumber className={isShort(group.peopleNeeded, plan.lanes) ? 'font-bold' : ''}>
                {peopleWords(group.peopleNeeded, group)}
                {isShort(group.peopleNeeded, plan.lanes) && group.peopleNeeded !== null && ` · ${group.peopleNeeded - plan.lanes} more`}
              </Td>
            </tr>
          ))}
        </tbody>
      </DataTable>
      <p>{withoutWindowsWords(order)}</p>
    </div>
  )
}

function withoutWindowsWords({ withoutWindows }: BayOrderView): string {
  if (withoutWindows === null) return ''
  const { settles, meanWaitMin, over10Min } = withoutWindows
  if (!settles || meanWaitMin === null)
    return 'If cars came whenever they like, the queue would never settle: more cars come than these people can look at.'
  const share = Math.round(over10Min * 100)
  return `If cars came whenever they like instead, a car would wait ${meanWaitMin.toFixed(meanWaitMin < 10 ? 1 : 0)} min on average, and ${share} in 100 longer than 10 min.`
}

function isShort(needed: number | null, lanes: number): boolean {
  return needed !== null && needed > lanes
}

function peopleWords(people: number | null, { firstSessionAt }: BayOrderView['groups'][number]): string {
  if (firstSessionAt === null) return 'not known'
  return people === null ? 'no number is enough' : String(people)
}
