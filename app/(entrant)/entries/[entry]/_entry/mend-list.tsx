import { OutcomeShape } from '@/app/_ui/outcome-shape'
import type { MyEntry } from '@/lib/contracts/my-entry'
import { Sources } from '../../../_answers/sources'

/** What is to be mended, and what was noted: with the figure that decided, its limit, what to bring, and where the limit comes from. */
export function MendList({ entry }: { readonly entry: MyEntry }) {
  if (entry.mend.length === 0 || entry.when === 'over') return null
  const isFail = entry.mend.some(({ weight }) => weight === 'fail')
  return (
    <section aria-labelledby="mend" className="grid gap-3">
      <h2 id="mend" className="text-xl">
        {isFail ? 'What to mend' : 'What to know'}
      </h2>
      <ul className="grid gap-4">
        {entry.mend.map((one) => (
          <li key={one.key} className="grid grid-cols-[auto_1fr] items-start gap-x-3 border-b pb-3">
            <OutcomeShape state={one.weight} className="mt-1 size-8" label={one.weight === 'fail' ? 'to mend' : 'to know'} />
            <div className="grid gap-1">
              <p className="text-muted">{one.whose ?? one.place}</p>
              <h3 className="text-lg">{one.prompt}</h3>
              <p className="font-bold">{one.words}</p>
              {one.bring !== '' && <p>{one.bring}</p>}
              <Sources source={one.source} />
            </div>
          </li>
        ))}
      </ul>
    </section>
  )
}
