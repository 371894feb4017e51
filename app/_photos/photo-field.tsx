'use client'

import { useId } from 'react'
import { Button } from '@/app/_ui/button'
import { Notice } from '@/app/_ui/notice'
import { PhotoButton } from '@/app/_ui/photo-button'
import { ServedPhoto } from './served-photo'
import { usePhotoSending } from './use-photo-sending'

export interface PhotoFieldProps {
  /** What is to be seen on it: “Label of the left belt”. */
  readonly label: string
  readonly description?: string
  /** Hash of the photograph that is there; null for none. */
  readonly value: string | null
  readonly onChange: (hash: string | null) => void
  readonly error?: string | undefined
}

const BUSY = { idle: null, preparing: 'Getting it ready …', sending: 'Sending …' } as const

/** A photograph in a form of an online page: taken or chosen, made small on the phone, sent at once, shown. Its value is the hash. */
export function PhotoField({ label, description, value, onChange, error }: PhotoFieldProps) {
  const id = useId()
  const { state, problem, take, again } = usePhotoSending(onChange)
  return (
    <div data-slot="photo-field" role="group" aria-labelledby={`${id}-label`} className="grid gap-1.5">
      <p id={`${id}-label`} className="font-bold">
        {label}
      </p>
      {description !== undefined && <p className="text-muted">{description}</p>}
      <div className="flex flex-wrap items-center gap-3">
        {value !== null && <ServedPhoto hash={value} words={label} />}
        <PhotoButton
          label={BUSY[state] ?? (value === null ? 'Take a photograph' : 'Take another')}
          isBusy={state !== 'idle'}
          describedBy={`${id}-label`}
          onPhoto={take}
        />
        {value !== null && (
          <Button look="quiet" onClick={() => onChange(null)}>
            Take it away
          </Button>
        )}
      </div>
      {problem !== null && (
        <Notice
          happened={problem.what}
          kept={problem.kept}
          todo={problem.todo}
          actions={again === null ? undefined : <Button onClick={again}>Send it again</Button>}
        />
      )}
      <p role="alert" className={error === undefined ? '' : 'border-l-8 border-line pl-3 font-bold'}>
        {error}
      </p>
    </div>
  )
}
