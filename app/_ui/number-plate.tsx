import { classNames } from './class-names'

const SIZES = { row: 'text-3xl', head: 'text-7xl', answer: 'text-9xl' } as const

export interface NumberPlateProps {
  /** The number of the car. The largest thing on any screen about one car. */
  readonly number: string
  readonly size?: keyof typeof SIZES
  readonly className?: string
}

/** The number of a car, condensed and heavy, its figures all of one width. Four figures and more stand a size smaller in an answer: a phone must hold them. */
export function NumberPlate({ number, size = 'head', className }: NumberPlateProps) {
  const isLong = size === 'answer' && number.length > 3
  return (
    <span data-slot="number-plate" className={classNames('figures inline-block', isLong ? 'text-8xl' : SIZES[size], className)}>
      {number}
    </span>
  )
}
