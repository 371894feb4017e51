'use client'

import { useSyncExternalStore } from 'react'
import { Button } from './button'

/** Kept in the browser; public/theme.js reads it before the first paint. */
export const THEME_KEY = 'lockwire.theme'

export type Theme = 'sun' | 'night'

/** Turns sun to night and back. The word is where it leads. */
export function ThemeSwitch() {
  const theme = useSyncExternalStore(subscribe, currentTheme, () => 'sun' as const)
  const next: Theme = theme === 'sun' ? 'night' : 'sun'
  return (
    <Button look="secondary" aria-label={`Switch to ${next}`} onClick={() => setTheme(next)}>
      {next === 'night' ? 'Night' : 'Sun'}
    </Button>
  )
}

/** Sets the theme of the page and keeps it for the next one. */
export function setTheme(theme: Theme): void {
  const root = document.documentElement
  if (theme === 'night') root.dataset.theme = 'night'
  else delete root.dataset.theme
  try {
    localStorage.setItem(THEME_KEY, theme)
  } catch (error) {
    // Storage refused: it holds for this page only.
    console.info(error) // eslint-disable-line no-console -- harmless, and nobody else would know
  }
}

function currentTheme(): Theme {
  return document.documentElement.dataset.theme === 'night' ? 'night' : 'sun'
}

function subscribe(listener: () => void): () => void {
  const observer = new MutationObserver(listener)
  observer.observe(document.documentElement, { attributes: true, attributeFilter: ['data-theme'] })
  return () => observer.disconnect()
}
