import { clockTime } from '@/app/_crew/say-when'
import type { Saving } from './use-saved-draft'

/** Where what was typed is, in one quiet line; loud only when it is on this phone alone. */
export function SavingLine({ saving, timeZone }: { readonly saving: Saving; readonly timeZone: string }) {
  return (
    <p role="status" className={saving.state === 'failed' ? 'border-l-8 bg-surface p-3 font-bold' : 'text-muted'}>
      {wordsOf(saving, timeZone)}
    </p>
  )
}

function wordsOf(saving: Saving, timeZone: string): string {
  switch (saving.state) {
    case 'waiting':
      return 'Saving …'
    case 'saved':
      return saving.at === null
        ? 'It is saved by itself while you fill it in.'
        : `Saved at ${clockTime(saving.at, timeZone)}. You can stop here and go on later.`
    case 'failed':
      return saving.isKeptHere
        ? `${saving.why} What you typed is kept on this phone and is sent again by itself.`
        : `${saving.why} What you typed is on this page only: leave it open. It is sent again by itself.`
  }
}
