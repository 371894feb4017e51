'use client'

import { useState } from 'react'
import { Button } from '@/app/_ui/button'
import { Notice } from '@/app/_ui/notice'
import { Tabs } from '@/app/_ui/tabs'
import { lookUpByNumber } from '@/lib/pass/look-up'
import type { PassList } from '@/lib/pass/pass-list'
import { CameraView } from './camera-view'
import { CodePad } from './code-pad'
import { NumberPad } from './number-pad'
import type { Asking } from './use-asking'

interface AskScreenProps {
  readonly list: PassList | null
  readonly asking: Asking
  readonly onHold: (entry: string) => void
  /** Holds a car whose number nobody read. */
  readonly onFind: () => void
}

/** Three ways to ask, on one screen: the camera, the number, the code under the sticker. */
export function AskScreen({ list, asking, onHold, onFind }: AskScreenProps) {
  const [pad, setPad] = useState<'number' | 'code'>('number')
  const [number, setNumber] = useState('')
  const found = list === null ? [] : lookUpByNumber(list, number)
  const [only] = found
  return (
    <div className="flex grow flex-col">
      <h1 className="sr-only">Pit exit</h1>
      {list === null && (
        <Notice
          happened="This device has no pass list yet, so every answer is HOLD."
          kept="Holds can still be recorded."
          todo="Go where there is signal; the list comes by itself."
          className="m-4"
        />
      )}
      <CameraView onText={asking.scan} />
      <div className="mt-auto px-4 pb-3 pt-1">
        <Tabs
          label="How to ask without the camera"
          tabs={[
            { id: 'number', label: 'Number' },
            { id: 'code', label: 'Code' },
          ]}
          current={pad}
          onChange={(id) => setPad(id === 'code' ? 'code' : 'number')}
        >
          {pad === 'number' ? (
            <NumberPad
              letters={lettersIn(list)}
              value={number}
              onChange={setNumber}
              onAsk={() => {
                asking.askNumber(number)
                setNumber('')
              }}
              onHold={
                only && found.length === 1
                  ? () => {
                      onHold(only.entry)
                      setNumber('')
                    }
                  : null
              }
            />
          ) : (
            <CodePad onAsk={asking.askCode} />
          )}
        </Tabs>
        <Button look="quiet" className="w-full" onClick={onFind}>
          Hold a car by its plate or looks
        </Button>
      </div>
    </div>
  )
}

/** Letters and signs that numbers of this event hold beside the figures: only those need a key. */
function lettersIn(list: PassList | null): readonly string[] {
  const all = list?.entries.flatMap(({ number }) => Array.from(number.toUpperCase())) ?? []
  return [...new Set(all)].filter((sign) => !/[0-9\s]/.test(sign)).sort()
}
