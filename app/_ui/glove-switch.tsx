'use client'

import { useSyncExternalStore } from 'react'
import { Choice } from './choice'

/** Kept in the browser; public/theme.js reads it before the first paint. */
const GLOVE_KEY = 'lockwire.glove'

/** Makes what records an outcome 126 px high (about 20 mm) instead of 96. */
export function GloveSwitch() {
  const isOn = useSyncExternalStore(subscribe, isGloved, () => false)
  return (
    <Choice checked={isOn} onChange={({ target }) => setGloved(target.checked)}>
      Larger buttons, for gloves
    </Choice>
  )
}

function setGloved(isOn: boolean): void {
  if (isOn) document.documentElement.dataset.glove = ''
  else delete document.documentElement.dataset.glove
  try {
    localStorage.setItem(GLOVE_KEY, isOn ? 'on' : 'off')
  } catch (error) {
    // Storage refused: it holds for this page only.
    console.info(error) // eslint-disable-line no-console -- harmless, and nobody else would know
  }
}

function isGloved(): boolean {
  return document.documentElement.dataset.glove !== undefined
}

function subscribe(listener: () => void): () => void {
  const observer = new MutationObserver(listener)
  observer.observe(document.documentElement, { attributes: true, attributeFilter: ['data-glove'] })
  return () => observer.disconnect()
}
