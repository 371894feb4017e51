import { VERDICT_SHAPES } from '@/app/_walk/verdict-words'
import { OutcomeShape } from '@/app/_ui/outcome-shape'
import { Wire } from '@/app/_ui/wire'
import type { MyEntry } from '@/lib/contracts/my-entry'

/** How the entry stands: before anybody has looked what the declaration comes to, from then on the verdict and its wire. */
export function Stands({ entry }: { readonly entry: MyEntry }) {
  const isLookedAt = entry.isPresented || !['not presented', 'declared only'].includes(entry.verdict)
  return (
    <section aria-label="How it stands" className="grid gap-4 border-y-[3px] py-5" aria-live="polite">
      {entry.when === 'over' ? <Over /> : isLookedAt ? <Seen entry={entry} /> : <Declared entry={entry} />}
    </section>
  )
}

/** A verdict is for its venue day: days later it would read as if nobody had looked. */
function Over() {
  return <p className="heading text-2xl">The event is over. What was seen and signed is kept.</p>
}

function Declared({ entry: { preCheck, declaration } }: { readonly entry: MyEntry }) {
  if (declaration.state !== 'signed')
    return (
      <>
        <p className="flex items-center gap-3">
          <OutcomeShape state="none" className="size-10" />
          <span className="heading text-2xl">Not declared</span>
        </p>
        <p className="max-w-prose">
          Declare the car and your kit, and you are told at once what would not be passed, while there is time to mend it.
        </p>
      </>
    )
  const { says, answered, asked } = preCheck
  return (
    <>
      <p className="flex items-center gap-3">
        {/* No square with a tick for a car that nobody has seen. */}
        <OutcomeShape
          state={says === 'would not be passed' ? 'fail' : says === 'will be looked at' ? 'advisory' : 'none'}
          className="size-10"
        />
        <span className="heading text-2xl">{WORDS[says]}</span>
      </p>
      <p className="max-w-prose">
        {answered} of {asked} answered. This is what the bay’s own rules make of what you declared. Nothing is passed yet: only a look at
        the car passes it.
      </p>
    </>
  )
}

const WORDS = {
  'would be passed': 'As declared, would be passed',
  'will be looked at': 'As declared, will be looked at',
  'would not be passed': 'As declared, would not be passed',
  'not answered': 'Declared in part',
} as const

function Seen({ entry: { verdict, held, bolts, sentence, hasLivePass } }: { readonly entry: MyEntry }) {
  const isPassed = verdict === 'passed' || verdict === 'passed with advisories'
  return (
    <>
      <p className="flex items-center gap-3">
        <OutcomeShape state={VERDICT_SHAPES[verdict]} className="size-12" />
        <span className="heading text-3xl first-letter:uppercase">{verdict}</span>
      </p>
      {held.map((words) => (
        <p key={words} className="font-bold">
          {words}
        </p>
      ))}
      {isPassed && (
        <p>
          {hasLivePass
            ? 'The car has its pass for today. The pit exit still decides who goes out.'
            : 'The pass is not issued yet: ask in the bay.'}
        </p>
      )}
      {bolts.length > 0 && <Wire scale="full" bolts={bolts} sentence={sentence} />}
      <p className="max-w-prose text-muted">
        A verdict says what was seen today without dismantling. It is no certificate and no warranty.
      </p>
    </>
  )
}
