import { Brand } from '@/app/_ui/brand'
import { ThemeSwitch } from '@/app/_ui/theme-switch'

/** The first line of a page that anybody may open. */
export function PlainBar() {
  return (
    <div className="flex flex-wrap items-center justify-between gap-3">
      <Brand />
      <ThemeSwitch />
    </div>
  )
}
