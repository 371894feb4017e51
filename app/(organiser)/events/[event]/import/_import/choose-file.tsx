'use client'

import { useId } from 'react'
import { buttonClass } from '@/app/_ui/button'
import { classNames } from '@/app/_ui/class-names'

interface ChooseFileProps {
  readonly isAnother: boolean
  readonly onChoose: (file: File) => void
}

/** Opens the browser's own file window. The input itself takes the focus; the words beside it are its label. */
export function ChooseFile({ isAnother, onChoose }: ChooseFileProps) {
  const id = useId()
  return (
    <div className="has-focus-visible:[&_label]:outline-3 has-focus-visible:[&_label]:outline-offset-2 has-focus-visible:[&_label]:outline-accent">
      <input
        id={id}
        type="file"
        accept=".csv,.txt,.tsv,text/csv,text/plain"
        className="sr-only"
        onChange={({ target }) => {
          const file = target.files?.[0]
          if (file) onChoose(file)
          // So that the same file, mended, can be chosen again.
          target.value = ''
        }}
      />
      <label htmlFor={id} className={classNames(buttonClass(isAnother ? 'secondary' : 'primary'), 'cursor-pointer')}>
        {isAnother ? 'Choose another file' : 'Choose an entry list'}
      </label>
    </div>
  )
}
