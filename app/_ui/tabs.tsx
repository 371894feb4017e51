'use client'

import { type KeyboardEvent, type ReactNode, useId, useRef } from 'react'
import { classNames } from './class-names'

export interface Tab {
  readonly id: string
  readonly label: ReactNode
}

export interface TabsProps {
  /** What the tabs part: “Car and driver”. */
  readonly label: string
  readonly tabs: readonly Tab[]
  readonly current: string
  readonly onChange: (id: string) => void
  /** The content of the current tab. */
  readonly children: ReactNode
}

/** Two or a few views of one thing. Arrow keys move between them. */
export function Tabs({ label, tabs, current, onChange, children }: TabsProps) {
  const id = useId()
  const list = useRef<HTMLDivElement>(null)
  const move = (event: KeyboardEvent) => {
    const step = event.key === 'ArrowRight' ? 1 : event.key === 'ArrowLeft' ? -1 : 0
    if (step === 0) return
    event.preventDefault()
    const index = (tabs.findIndex((tab) => tab.id === current) + step + tabs.length) % tabs.length
    const next = tabs[index]
    if (next) onChange(next.id)
    list.current?.querySelectorAll('button')[index]?.focus()
  }
  return (
    <div data-slot="tabs">
      <div ref={list} role="tablist" aria-label={label} onKeyDown={move} className="flex border-b-[3px]">
        {tabs.map((tab) => {
          const isCurrent = tab.id === current
          return (
            <button
              key={tab.id}
              type="button"
              role="tab"
              id={`${id}-${tab.id}`}
              aria-selected={isCurrent}
              aria-controls={`${id}-panel`}
              tabIndex={isCurrent ? 0 : -1}
              onClick={() => onChange(tab.id)}
              className={classNames('target grow px-4 py-2 font-bold sm:grow-0', isCurrent ? 'bg-ink text-ground' : 'bg-ground text-ink')}
            >
              {tab.label}
            </button>
          )
        })}
      </div>
      <div role="tabpanel" id={`${id}-panel`} aria-labelledby={`${id}-${current}`} className="pt-4">
        {children}
      </div>
    </div>
  )
}
