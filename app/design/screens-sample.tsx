import { AnswerScreen } from '@/app/_ui/answer-screen'
import { NumberPlate } from '@/app/_ui/number-plate'
import { Strip } from '@/app/_ui/strip'
import { Sample } from './sample'

const ANSWERS = [
  { state: 'ok', word: 'PASSED', number: '232', lines: ['…90 VGN · turquoise', 'Halden 1.6 hatch'], foot: 'band 118 may drive · passenger seat usable' },
  { state: 'held', word: 'HOLD', number: '103', lines: ['fluid dropped, 09:31', 'engine bay, tyres, discs to be seen'], foot: 'send to the bay · sticker still on: take it off' },
  { state: 'ask', word: 'CHECK', number: '88', lines: ['list is 41 min old', 'ask on the radio: “list, holds?”'], foot: 'signature good · Brack 30 coupe, white, …S4 FRV' },
] as const // prettier-ignore

/** Strips, numbers and the answers as they fill a screen. */
export function ScreensSample() {
  return (
    <Sample title="Strips and answers">
      <div className="max-w-[480px] border">
        <Strip end="07:41">offline since 07:12 · 14 to send</Strip>
        <Strip end="10:20" isLoud>
          storage is nearly full: send before the next car
        </Strip>
      </div>
      <p className="flex flex-wrap items-end gap-8">
        <NumberPlate number="232" />
        <NumberPlate number="7" />
        <NumberPlate number="305" size="row" />
      </p>
      <div className="grid gap-6 md:grid-cols-2 lg:grid-cols-3">
        {ANSWERS.map((answer) => (
          <div key={answer.word} className="flex min-h-[640px] flex-col border">
            <Strip end="09:42 · B running">list 14 · 3 min old</Strip>
            <AnswerScreen {...answer} />
            <div className="border-t px-4 py-3">
              held now
              <p className="figures flex flex-wrap gap-x-6 gap-y-2 text-6xl">
                <span>47</span>
                <span>103</span>
                <span>311</span>
              </p>
            </div>
          </div>
        ))}
      </div>
    </Sample>
  )
}
