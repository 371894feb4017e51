import Link from 'next/link'
import type { ReactNode } from 'react'
import { SignOut } from '@/app/(organiser)/_frame/sign-out'
import { Brand } from '@/app/_ui/brand'
import { PageFrame } from '@/app/_ui/page-frame'
import { ThemeSwitch } from '@/app/_ui/theme-switch'

interface EntrantFrameProps {
  readonly title: string
  readonly subtitle?: ReactNode
  readonly tab: 'cars' | 'kit' | null
  readonly children: ReactNode
}

const TABS = [
  { tab: 'cars', label: 'My cars', href: '/cars' },
  { tab: 'kit', label: 'My kit', href: '/kit' },
] as const

/** A page of an entrant: made for a phone in the sun, one column, the few ways on at the top. */
export function EntrantFrame({ title, subtitle, tab, children }: EntrantFrameProps) {
  return (
    <PageFrame title={title} subtitle={subtitle} width="text" navigation={<EntrantBar tab={tab} />}>
      {children}
    </PageFrame>
  )
}

function EntrantBar({ tab }: Pick<EntrantFrameProps, 'tab'>) {
  return (
    <div className="grid gap-2">
      <div className="flex items-center justify-between gap-2">
        <Brand />
        <ThemeSwitch />
      </div>
      <div className="flex flex-wrap items-center justify-between gap-2">
        <nav aria-label="Mine">
          <ul className="flex">
            {TABS.map(({ tab: own, label, href }) => (
              <li key={own}>
                <Link
                  href={href}
                  aria-current={own === tab ? 'page' : undefined}
                  className="target heading flex items-center border-b-4 border-transparent px-2 text-lg aria-[current=page]:border-accent"
                >
                  {label}
                </Link>
              </li>
            ))}
          </ul>
        </nav>
        <SignOut />
      </div>
    </div>
  )
}
