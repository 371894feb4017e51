import { dayWords } from '@/app/_crew/say-when'
import { NumberPlate } from '@/app/_ui/number-plate'
import { OutcomeShape, type OutcomeState } from '@/app/_ui/outcome-shape'
import type { Sticker } from '@/lib/public-pass/sticker'

type Known = Exclude<Sticker, { readonly is: 'not-ours' }>

/** What a pass of ours is worth now: shape, word, day, number to compare; and what a pass is not. */
export function StickerWords({ sticker }: { readonly sticker: Known }) {
  const { shape, says, means } = wordsOf(sticker)
  const [name, tail] = sticker.what === 'pass' ? ['Number', sticker.plateTail] : ['Band', '']
  return (
    <div className="grid gap-6">
      <p className="flex items-center gap-4">
        <OutcomeShape state={shape} className="size-16" />
        <span className="heading text-3xl">{says}</span>
      </p>
      <dl className="flex flex-wrap gap-x-10 gap-y-3 border-y-2 py-4">
        <div>
          <dt className="text-muted">{name}</dt>
          <dd>
            <NumberPlate number={sticker.number} size="head" />
          </dd>
        </div>
        {tail !== '' && (
          <div>
            <dt className="text-muted">Plate ends in</dt>
            <dd className="serial text-5xl font-bold">{tail}</dd>
          </div>
        )}
      </dl>
      <p className="max-w-prose">{means}</p>
      {sticker.conditions && sticker.is === 'valid' && (
        <p className="max-w-prose font-bold">It runs under conditions; the crew knows them.</p>
      )}
      {sticker.what === 'pass' && (
        <p className="max-w-prose">Compare number and plate with the car: a copied sticker shows the same page on another car.</p>
      )}
      <p className="max-w-prose border-t pt-4 text-muted">
        A pass records what was seen that day without dismantling. It is no certificate and no warranty, and what could not be seen is
        listed with the crew. Only the pit exit decides who goes out: this page may be older than its list.
      </p>
    </div>
  )
}

function wordsOf(sticker: Known): { readonly shape: OutcomeState; readonly says: string; readonly means: string } {
  const days =
    sticker.firstDay === sticker.lastDay ? dayWords(sticker.firstDay) : `${dayWords(sticker.firstDay)} to ${dayWords(sticker.lastDay)}`
  const it = sticker.what === 'pass' ? 'This pass' : 'This band'
  switch (sticker.is) {
    case 'valid':
      return { shape: 'ok', says: `Valid on ${days}`, means: `${it} was issued for today and nothing known here stands against it.` }
    case 'another-day':
      return { shape: 'fail', says: 'Not valid today', means: `${it} is for ${days}. Today is ${dayWords(sticker.today)} at the venue.` }
    case 'not-valid':
      return {
        shape: 'fail',
        says: 'Not valid',
        means: `${it} no longer counts: held, withdrawn, replaced, or something has to be seen again. The crew in the bay knows which.`,
      }
    case 'not-reported':
      return {
        shape: 'ask',
        says: 'Ask the crew',
        means: `${it} was signed by a device of this event, but the server has not heard of it yet. Devices without signal send later.`,
      }
  }
}
