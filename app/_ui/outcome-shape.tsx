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
          {/* Amber on white is hardly seen: the outline is what makes the triangle. */}
          <path
            d="M0-10.2 11.2 9.2H-11.2Z"
            strokeWidth="1.4"
            strokeLinejoin="round"
            className={inverse ? 'fill-advisory-ink stroke-advisory-ink' : 'fill-advisory stroke-advisory-ink'}
          />
          <path d="M-1.7-4.6h3.4l-.5 7.4h-2.4zM-1.6 4.6h3.2v3.2h-3.2z" className={inverse ? 'fill-advisory' : 'fill-advisory-ink'} />
        </>
      )
    case 'fail':
      return <StopSign radius={11} inverse={inverse} />
    case 'held':
      return (
        <>
          <circle r="11.3" strokeWidth="1.2" className="fill-advisory stroke-advisory-ink" />
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

const HELD_HATCH = ringHatchPath(8, 11.3, 3.6)

function StopSign({ radius, inverse }: { readonly radius: number; readonly inverse: boolean }) {
  const half = radius * 0.62
  return (
    <>
      <circle r={radius} className={inverse ? 'fill-fail-ink' : 'fill-fail'} />
      <rect x={-half} y={-radius * 0.19} width={half * 2} height={radius * 0.38} className={inverse ? 'fill-fail' : 'fill-fail-ink'} />
    </>
  )
}

/** Half of it is known: one half is filled, and the mark changes colour where it crosses. */
function AskSign({ inverse }: { readonly inverse: boolean }) {
  const [own, other] = inverse ? (['ask-ink', 'ask'] as const) : (['ask', 'ask-ink'] as const)
  return (
    <>
      <path d="M0-10.6 10.6 0 0 10.6-10.6 0Z" strokeWidth="2" className={inverse ? 'fill-ask stroke-ask-ink' : 'fill-ground stroke-ask'} />
      <path d="M0-12V12L-12 0Z" className={own === 'ask' ? 'fill-ask' : 'fill-ask-ink'} />
      {/* A nested svg cuts at its edge: no clip path, so no id that two of them would share. */}
      <svg x="-12" y="-12" width="12" height="24" viewBox="-12 -12 12 24">
        <QuestionMark className={other === 'ask' ? 'fill-ask stroke-ask' : 'fill-ask-ink stroke-ask-ink'} />
      </svg>
      <svg x="0" y="-12" width="12" height="24" viewBox="0 -12 12 24">
        <QuestionMark className={own === 'ask' ? 'fill-ask stroke-ask' : 'fill-ask-ink stroke-ask-ink'} />
      </svg>
    </>
  )
}

function QuestionMark({ className }: { readonly className: string }) {
  return (
    <g className={className}>
      <path d="M-3.6-2.6a3.6 3.4 0 1 1 5.3 3C.4 1.2 0 1.9 0 3.2" strokeWidth="2.6" fill="none" fillOpacity="0" />
      <rect x="-1.5" y="4.7" width="3" height="3" stroke="none" strokeOpacity="0" />
    </g>
  )
}
