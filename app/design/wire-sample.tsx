'use client'

import { useState } from 'react'
import type { OutcomeState } from '@/app/_ui/outcome-shape'
import { Wire } from '@/app/_ui/wire'
import type { WireBolt } from '@/app/_ui/wire-links'
import { Sample } from './sample'

const LABELS = ['papers', 'seat', 'harness', 'cage', 'cabin', 'electrics', 'engine bay', 'fuel', 'brakes', 'wheels', 'suspension', 'body & aero', 'noise', 'high volt.'] // prettier-ignore

function bolts(states: string): readonly WireBolt[] {
  const words: Readonly<Record<string, OutcomeState>> = { o: 'ok', a: 'advisory', f: 'fail', q: 'ask', '.': 'none', n: 'na', h: 'held' }
  return Array.from(states, (letter, index) => ({ label: LABELS[index] ?? '', state: words[letter] ?? 'none' }))
}

const ROWS = [
  { number: '232', states: 'ooanoooof..oon', sentence: '8 of 12 stations ok, brakes failed, harness with advisories, 2 to see' },
  { number: '17', states: 'ooanoooooooooo', sentence: '13 of 13 stations ok, harness with advisories' },
  { number: '305', states: '..............', sentence: '0 of 14 stations ok, 14 to see' },
  { number: '88', states: 'oooooqoo......', sentence: '7 of 14 stations ok, 7 to see' },
  { number: '103', states: 'oooooohoohooon', sentence: '11 of 13 stations ok, engine bay, wheels held' },
] as const

/** The wire in its three scales. */
export function WireSample() {
  const [current, setCurrent] = useState(8)
  const [extra, setExtra] = useState('.')
  return (
    <Sample title="The wire">
      <Wire scale="full" bolts={bolts('ooanoooof..oqh')} sentence={ROWS[0].sentence} current={current} onSelect={setCurrent} />
      <Wire
        scale="full"
        bolts={bolts(`oo${extra}oo`)}
        sentence="4 of 5 stations ok, press the third to close it"
        onSelect={() => setExtra(extra === '.' ? 'o' : '.')}
      />
      <div className="grid gap-x-12 md:grid-cols-2">
        {ROWS.map(({ number, states, sentence }) => (
          <div key={number} className="flex min-h-14 items-center gap-4 border-b">
            <span className="figures w-16 shrink-0 text-3xl">{number}</span>
            <Wire scale="strip" bolts={bolts(states)} sentence={sentence} />
          </div>
        ))}
      </div>
      <div className="grid grid-cols-[repeat(auto-fill,minmax(136px,1fr))] gap-1.5">
        {ROWS.map(({ number, states, sentence }) => (
          <div key={number} className="grid gap-1 border px-2 py-1.5">
            <span className="figures text-3xl">{number}</span>
            <Wire scale="mark" bolts={bolts(states)} sentence={sentence} />
          </div>
        ))}
      </div>
    </Sample>
  )
}
