'use client'

import { useState } from 'react'
import { Button } from '@/app/_ui/button'
import { DataTable, Td, Th } from '@/app/_ui/data-table'
import { Dialog } from '@/app/_ui/dialog'
import type { CrewMemberView } from '@/lib/contracts/crew'
import type { Decision } from './use-crew'

interface CrewTableProps {
  readonly crew: readonly CrewMemberView[]
  readonly mayDecide: boolean
  readonly onDecide: (member: CrewMemberView, decision: Decision) => Promise<void>
}

const STATES: Readonly<Record<CrewMemberView['state'], string>> = {
  waiting: 'waiting',
  accepted: 'accepted',
  refused: 'refused',
  ended: 'role ended',
}

/** Who is crew, and who no longer is. */
export function CrewTable({ crew, mayDecide, onDecide }: CrewTableProps) {
  const [ending, setEnding] = useState<CrewMemberView | null>(null)
  const [busy, setBusy] = useState(false)
  const accepted = crew.filter(({ state }) => state === 'accepted').length

  async function end(member: CrewMemberView): Promise<void> {
    setBusy(true)
    await onDecide(member, 'end')
    setBusy(false)
    setEnding(null)
  }

  return (
    <>
      <DataTable caption={`Crew: ${accepted} accepted`} className="[&_td]:align-middle [&_th]:align-middle">
        <thead>
          <tr>
            <Th>Name</Th>
            <Th>Role</Th>
            <Th>Came by</Th>
            <Th>State</Th>
            {mayDecide && (
              <Th className="relative">
                <span className="sr-only">End</span>
              </Th>
            )}
          </tr>
        </thead>
        <tbody>
          {crew.map((member) => (
            <tr key={member.id}>
              <Th scope="row">{member.name}</Th>
              <Td>{member.role}</Td>
              <Td>{member.hasAccount ? 'account' : 'join code'}</Td>
              <Td>{STATES[member.state]}</Td>
              {mayDecide && (
                <Td>
                  {member.state === 'accepted' && (
                    <Button look="quiet" aria-label={`End the role of ${member.name}`} onClick={() => setEnding(member)}>
                      End
                    </Button>
                  )}
                </Td>
              )}
            </tr>
          ))}
        </tbody>
      </DataTable>
      <Dialog
        isOpen={ending !== null}
        onClose={() => setEnding(null)}
        title={`End the role of ${ending?.name ?? ''}?`}
        actions={
          <>
            <Button look="secondary" onClick={() => setEnding(null)}>
              Keep it
            </Button>
            <Button isBusy={busy} onClick={() => ending && void end(ending)}>
              End the role
            </Button>
          </>
        }
      >
        What {ending?.name} recorded until now stands. Later records that permit something no longer count; those that stop still do. It
        cannot be undone: to come back they ask again by a new join code.
      </Dialog>
    </>
  )
}
