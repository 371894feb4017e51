'use client'

import { useState } from 'react'
import { Choice } from '@/app/_ui/choice'
import { SelectField, TextAreaField, TextField } from '@/app/_ui/field'
import { Keypad } from '@/app/_ui/keypad'
import { FIGURE_KEYS, TextKeys } from '@/app/_ui/text-keys'
import { Sample } from './sample'

/** Fields and keys. */
export function EntrySample() {
  const [pad, setPad] = useState('2.6')
  const [week, setWeek] = useState('1419')
  return (
    <Sample title="Fields and keys">
      <div className="grid gap-8 md:grid-cols-2">
        <div className="grid content-start gap-4">
          <TextField label="Plate" description="As on the car; spaces do not matter." defaultValue="K90 VGN" />
          <TextField label="Number" error="Number 232 is taken by another car. Choose a free one; nothing was saved." defaultValue="232" />
          <TextField label="Plate of the trailer" isOptional />
          <TextField label="Entry code" disabled defaultValue="K7QM-2R9T" />
          <SelectField label="Run group" defaultValue="b">
            <option value="a">A Novice</option>
            <option value="b">B Intermediate</option>
          </SelectField>
          <TextAreaField label="Anything else I do not like" defaultValue="Hose rubs at full lock" />
          <fieldset>
            <legend className="font-bold">Who rides</legend>
            <Choice defaultChecked>Driver</Choice>
            <Choice>Passenger</Choice>
            <Choice disabled>Instructor</Choice>
          </fieldset>
          <fieldset>
            <legend className="font-bold">Depth</legend>
            <Choice type="radio" name="depth" defaultChecked>
              look-over
            </Choice>
            <Choice type="radio" name="depth">
              standard
            </Choice>
          </fieldset>
        </div>
        <div className="grid max-w-[420px] content-start gap-10">
          <Keypad
            label="Thinner pad, front left"
            value={pad}
            onChange={setPad}
            unit="mm"
            limit="limit 3.0 mm"
            judgement={pad === '' ? 'Type what you measure.' : `${pad} mm against 3.0 mm`}
          />
          <TextKeys
            label="Date code on the sidewall"
            description="Week and year, such as 1419"
            value={week}
            onChange={setWeek}
            keys={FIGURE_KEYS}
            maxLength={4}
            judgement={week.length === 4 ? `week ${week.slice(0, 2)} of 20${week.slice(2)}` : 'Four figures.'}
          />
        </div>
      </div>
    </Sample>
  )
}
