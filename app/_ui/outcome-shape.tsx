import { hexagonPoints, ringHatchPath } from './wire-geometry'

export type OutcomeState = 'ok' | 'advisory' | 'fail' | 'ask' | 'none' | 'na' | 'held'

/** `plain`: on the ground or on steel. `inverse`: on a ground filled with the outcome's own colour. */
export type OutcomeTone = 'plain' | 'inverse'

export interface OutcomeShapeProps {
  readonly state: OutcomeState
  readonly tone?: OutcomeTone
  /** Size by class (`size-8`); the shape fills its box. */
  readonly className?: string
  /** Left out where the word stands beside it. */
  readonly label?: string
}

/** The shape of an outcome, read before its word and its colour: square, triangle, circle with bar, half-filled diamond, hatch, dash, empty bolt. */
export function OutcomeShape({ state, tone = 'plain', className = 'size-6', label }: OutcomeShapeProps) {
  const name = label === undefined ? { 'aria-hidden': true as const } : { role: 'img', 'aria-label': label }
  return (
    <svg data-slot="outcome-shape" data-state={state} viewBox="-12 -12 24 24" className={`shrink-0 ${className}`} {...name}>
      <OutcomeMark state={state} tone={tone} />
    </svg>
  )
}

/** The same drawing inside another SVG, about its origin, 24 units wide. */
export function OutcomeMark({ state, tone = 'plain' }: Pick<OutcomeShapeProps, 'state' | 'tone'>) {
  const inverse = tone === 'inverse'
  switch (state) {
    case 'ok':
      return (
        <>
          <rect x="-10" y="-10" width="20" height="20" className={inverse ? 'fill-ok-ink' : 'fill-ok'} />
          <path
            d="M-5.6.4-1.7 4.6 5.6-4.9"
            fill="none"
            strokeWidth="3.4"
            strokeLinecap="square"
            className={inverse ? 'stroke-ok' : 'stroke-ok-ink'}
          />
        </>
      )
    case 'advisory':
      return (
        <>
          <path d="M0-11.2 12 9.8H-12Z" className={inverse ? 'fill-advisory-ink' : 'fill-advisory'} />
          <path d="M-1.7-4.6h3.4l-.5 7.4h-2.4zM-1.6 4.6h3.2v3.2h-3.2z" className={inverse ? 'fill-advisory' : 'fill-advisory-ink'} />
        </>
      )
    case 'fail':
      return <StopSign radius={11} inverse={inverse} />
    case 'held':
      return (
        <>
          <circle r="9.9" fill="none" strokeWidth="4" className="stroke-advisory" />
          <path d={HELD_HATCH} fill="none" strokeWidth="1.7" className="stroke-advisory-ink" />
          <StopSign radius={7.4} inverse={inverse} />
        </>
      )
    case 'ask':
      return <AskSign inverse={inverse} />
    case 'na':
      return (
        <>
          <polygon points={hexagonPoints(0, 0, 11)} strokeWidth="1.8" className="fill-none stroke-current" />
          <path d="M-4.6 0h9.2" strokeWidth="2.6" className="stroke-current" />
        </>
      )
    case 'none':
      return <polygon points={hexagonPoints(0, 0, 11)} strokeWidth="1.8" className="fill-none stroke-muted" />
  }
}

const HELD_HATCH = ringHatchPath(8, 11.9, 3.6)

function StopSign({ radius, inverse }: { readonly radius: number; readonly inverse: boolean }) {
  const half = radius * 0.62
  return (
    <>
      <circle r={radius} className={inverse ? 'fill-fail-ink' : 'fill-fail'} />
      <rect x={-half} y={-radius * 0.19} width={half * 2} height={radius * 0.38} className={inverse ? 'fill-fail' : 'fill-fail-ink'} />
    </>
  )
}

/** Half of it is known: the lower half is filled, and the mark's hook stands in the empty one. */
function AskSign({ inverse }: { readonly inverse: boolean }) {
  return (
    <>
      <path d="M0-11.4 11.4 0 0 11.4-11.4 0Z" className={inverse ? 'fill-ask' : 'fill-ground'} />
      <path d="M-11.4 1.2-11.4 0h22.8v1.2L0 11.4Z" className={inverse ? 'fill-ask-ink' : 'fill-ask'} />
      <path
        d="M0-10 10 0 0 10-10 0Z"
        fill="none"
        strokeWidth="2"
        strokeLinejoin="miter"
        className={inverse ? 'stroke-ask-ink' : 'stroke-ask'}
      />
      <path
        d="M-2.9-3.6a2.9 2.7 0 1 1 4.3 2.3q-1.4.8-1.4 2.4"
        fill="none"
        strokeWidth="2"
        className={inverse ? 'stroke-ask-ink' : 'stroke-ask'}
      />
      <path d="M0 0v2.3M0 4v2.4" fill="none" strokeWidth="2.2" className={inverse ? 'stroke-ask' : 'stroke-ask-ink'} />
    </>
  )
}
