import Link from 'next/link'
import { Brand } from '@/app/_ui/brand'
import { ThemeSwitch } from '@/app/_ui/theme-switch'
import { SignOut } from './sign-out'

/** The first line of an office page: home, events, who is signed in. */
export function OfficeBar({ name }: { readonly name: string }) {
  return (
    <div className="flex flex-wrap items-center justify-between gap-x-4 gap-y-2">
      <div className="flex items-center gap-4">
        <Brand />
        <Link href="/events" className="target inline-flex items-center text-accent underline underline-offset-4">
          Events
        </Link>
      </div>
      <div className="flex items-center gap-3">
        <span className="hidden text-muted sm:inline">{name}</span>
        <ThemeSwitch />
        <SignOut />
      </div>
    </div>
  )
}
