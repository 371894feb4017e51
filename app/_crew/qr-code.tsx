'use client'

import { useEffect, useState } from 'react'

interface QrCodeProps {
  readonly text: string
  readonly label: string
  readonly className?: string
}

/** Modules of quiet zone that readers are promised (ISO/IEC 18004). */
const QUIET = 4

/** A QR code, error correction Q, black on white in either theme, its quiet zone included. */
export function QrCode({ text, label, className }: QrCodeProps) {
  const [code, setCode] = useState<{ readonly path: string; readonly size: number } | null>(null)
  useEffect(() => {
    let gone = false
    // Loaded when a code is first drawn: the walk does not need it.
    void import('qrcode').then(({ create }) => {
      if (!gone) setCode(draw(create(text, { errorCorrectionLevel: 'Q' }).modules))
    })
    return () => {
      gone = true
    }
  }, [text])
  const full = (code?.size ?? 49) + 2 * QUIET
  return (
    <svg
      viewBox={`0 0 ${full} ${full}`}
      role="img"
      aria-label={label}
      data-ready={code !== null}
      shapeRendering="crispEdges"
      className={className}
    >
      <rect width={full} height={full} fill="#fff" />
      {code && <path d={code.path} fill="#000" />}
    </svg>
  )
}

function draw(modules: { readonly size: number; readonly get: (row: number, column: number) => number }): { path: string; size: number } {
  let path = ''
  for (let row = 0; row < modules.size; row += 1)
    for (let column = 0; column < modules.size; column += 1)
      if (modules.get(row, column)) path += `M${column + QUIET} ${row + QUIET}h1v1h-1z`
  return { path, size: modules.size }
}
