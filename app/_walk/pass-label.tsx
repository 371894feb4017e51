'use client'

import { createPortal } from 'react-dom'
import { QrCode } from '@/app/_crew/qr-code'
import { dayWords } from '@/app/_crew/say-when'
import './pass-label.css'

export interface PassLabelProps {
  readonly number: string
  readonly plate: string
  readonly day: string
  readonly venue: string
  readonly text: string
  readonly code: string
}

/** The pass as a code on the screen, and twice as a 100 × 62 mm label on paper. */
export function PassLabel(props: PassLabelProps) {
  return (
    <>
      <Label {...props} className="pass-label pass-label-screen" />
      {createPortal(
        <div className="print-only" aria-hidden="true">
          <Label {...props} className="pass-label" />
          <Label {...props} className="pass-label" />
        </div>,
        document.body,
      )}
    </>
  )
}

function Label({ number, plate, day, venue, text, code, className }: PassLabelProps & { readonly className: string }) {
  return (
    <div className={className} data-slot="pass-label">
      <div className="pass-label-left">
        <QrCode text={text} label={`Code of the pass for ${number}`} className="pass-label-code" />
        <p className="pass-label-typed serial">{code}</p>
      </div>
      <div className="pass-label-right">
        <p className="pass-label-number figures" data-long={number.length > 3}>
          {number}
        </p>
        <p className="pass-label-day">{dayWords(day)}</p>
        <p>{plate}</p>
        <p>{venue}</p>
        <p className="pass-label-caution">seen on the day, without dismantling</p>
        <svg viewBox="0 0 100 6" className="pass-label-rule" aria-hidden="true">
          <path d="M.5 0v6M99.5 0v6M0 3h100" stroke="#000" strokeWidth="1" fill="none" />
        </svg>
        <p className="pass-label-caution">this line prints 30 mm long</p>
      </div>
    </div>
  )
}
