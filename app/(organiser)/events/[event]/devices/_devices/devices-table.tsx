import { clockTime } from '@/app/_crew/say-when'
import { Button } from '@/app/_ui/button'
import { DataTable, Td, Th } from '@/app/_ui/data-table'
import type { DeviceView } from '@/lib/contracts/devices'
import type { OutOfUse } from './take-out-dialog'

interface DevicesTableProps {
  readonly devices: readonly DeviceView[]
  readonly timeZone: string
  readonly mayRetire: boolean
  readonly onTakeOut: (asked: OutOfUse) => void
}

/** Devices by number: whose, when last heard, what they still hold. */
export function DevicesTable({ devices, timeZone, mayRetire, onTakeOut }: DevicesTableProps) {
  return (
    <DataTable
      caption={devices.length === 1 ? '1 device' : `${devices.length} devices`}
      className="[&_td]:align-middle [&_th]:align-middle"
    >
      <thead>
        <tr>
          <Th>No.</Th>
          <Th>Device</Th>
          <Th>People</Th>
          <Th>State</Th>
          <Th>Last heard</Th>
          <Th>Still to send</Th>
          {mayRetire && (
            <Th className="relative">
              <span className="sr-only">Take out of use</span>
            </Th>
          )}
        </tr>
      </thead>
      <tbody>
        {devices.map((device) => (
          <tr key={device.id}>
            <Td isNumber>{device.kid}</Td>
            <Th scope="row">{device.name}</Th>
            <Td>{device.people.map(({ name, roles }) => `${name} (${roles.join(', ')})`).join('; ')}</Td>
            <Td>{{ active: 'active', retired: 'retired', lost: 'reported lost' }[device.state]}</Td>
            <Td className="whitespace-nowrap">{device.lastContactAt === null ? 'never' : clockTime(device.lastContactAt, timeZone)}</Td>
            <Td>{device.unsent === null ? 'never said' : device.unsent === 0 ? 'nothing' : `${device.unsent} when last heard`}</Td>
            {mayRetire && (
              <Td>
                <TakeOut device={device} onTakeOut={onTakeOut} />
              </Td>
            )}
          </tr>
        ))}
      </tbody>
    </DataTable>
  )
}

function TakeOut({ device, onTakeOut }: { readonly device: DeviceView; readonly onTakeOut: (asked: OutOfUse) => void }) {
  if (device.state === 'lost') return null
  return (
    <div className="flex gap-2">
      {device.state === 'active' && (
        <Button look="quiet" aria-label={`Retire ${device.name}`} onClick={() => onTakeOut({ device, as: 'retired' })}>
          Retire
        </Button>
      )}
      <Button look="quiet" aria-label={`Report ${device.name} lost`} onClick={() => onTakeOut({ device, as: 'lost' })}>
        Report lost
      </Button>
    </div>
  )
}
