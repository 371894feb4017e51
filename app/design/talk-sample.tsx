'use client'

import { useState } from 'react'
import { Button } from '@/app/_ui/button'
import { DataTable, Td, Th } from '@/app/_ui/data-table'
import { Dialog } from '@/app/_ui/dialog'
import { EmptyState } from '@/app/_ui/empty-state'
import { Notice } from '@/app/_ui/notice'
import { Progress } from '@/app/_ui/progress'
import { Sheet } from '@/app/_ui/sheet'
import { Tabs } from '@/app/_ui/tabs'
import { UndoBar } from '@/app/_ui/undo-bar'
import { Sample } from './sample'

/** How the app talks: notices, progress, empty places, tables, tabs, dialogs. */
export function TalkSample() {
  const [tab, setTab] = useState('car')
  const [open, setOpen] = useState<'dialog' | 'sheet' | null>(null)
  const close = () => setOpen(null)
  return (
    <Sample title="How it talks">
      <div className="grid gap-6 md:grid-cols-2">
        <Notice
          happened="The server did not answer."
          kept="14 records wait on this phone."
          todo="Go on with the walk; they are sent when the network is back."
        />
        <Notice weight="news" happened="The day is loaded." todo="You can switch the network off now." />
        <Progress label="Loading the day" done={96} total={142} unit="entries" />
        <Progress label="Reading the list" done={311} total={null} unit="rows" />
        <EmptyState title="No entries yet" actions={<Button>Import an entry list</Button>}>
          Import the list you have; a trial run names each row that does not fit.
        </EmptyState>
        <UndoBar done="Front left: thinner pad 2.6 mm, fail" onUndo={() => undefined} />
      </div>
      <Tabs
        label="Car and driver"
        current={tab}
        onChange={setTab}
        tabs={[
          { id: 'car', label: 'Car' },
          { id: 'person', label: 'Helmet & kit' },
        ]}
      >
        {tab === 'car' ? (
          <DataTable caption="Cars in the bay">
            <thead>
              <tr>
                <Th>Number</Th>
                <Th>Car</Th>
                <Th>Seen by</Th>
                <Th className="text-right">Open</Th>
              </tr>
            </thead>
            <tbody>
              {CARS.map(([number, car, who, left]) => (
                <tr key={number}>
                  <Th scope="row">{number}</Th>
                  <Td>{car}</Td>
                  <Td>{who}</Td>
                  <Td isNumber>{left}</Td>
                </tr>
              ))}
            </tbody>
          </DataTable>
        ) : (
          <p>Helmet with its label, suit, gloves.</p>
        )}
      </Tabs>
      <div className="flex flex-wrap gap-4">
        <Button look="secondary" onClick={() => setOpen('dialog')}>
          Open a dialog
        </Button>
        <Button look="secondary" onClick={() => setOpen('sheet')}>
          Open a sheet
        </Button>
      </div>
      <Dialog
        isOpen={open === 'dialog'}
        onClose={close}
        title="Sign out with 14 records unsent?"
        actions={
          <>
            <Button onClick={close}>Send them first</Button>
            <Button look="secondary" onClick={close}>
              Hand them over
            </Button>
          </>
        }
      >
        They stay on this phone until they are sent.
      </Dialog>
      <Sheet isOpen={open === 'sheet'} onClose={close} title="Why was it not passed?" actions={<Button onClick={close}>Done</Button>}>
        Choose what you saw.
      </Sheet>
    </Sample>
  )
}

const CARS = [
  ['232', 'Halden 1.6 hatch', 'I. Marsh', '2'],
  ['17', 'Brack 30 coupe', 'I. Marsh', '0'],
] as const
