import type { FormState } from '@/app/(entrant)/_answers/form-state'

const NAME = 'lockwire.declaration.'

/** Keeps a form on this phone while the server cannot be reached; false where the browser keeps nothing. */
export function keepForm(entry: string, form: FormState): boolean {
  try {
    window.localStorage.setItem(`${NAME}${entry}`, JSON.stringify(form))
    return true
  } catch (error) {
    // A full or refused storage: the page still holds it, and says so.
    if (error instanceof DOMException) return false
    throw error
  }
}

/** The form this phone still holds; null for none. Forgotten as soon as the server has it. */
export function keptForm(entry: string): FormState | null {
  try {
    const kept = JSON.parse(window.localStorage.getItem(`${NAME}${entry}`) ?? 'null') as Partial<FormState> | null
    return kept?.facts && kept.typed && kept.photos && typeof kept.changes === 'string' ? (kept as FormState) : null
  } catch (error) {
    if (error instanceof SyntaxError || error instanceof DOMException) return null
    throw error
  }
}

/** The server has it: nothing personal stays on the phone. */
export function forgetForm(entry: string): void {
  try {
    window.localStorage.removeItem(`${NAME}${entry}`)
  } catch (error) {
    if (!(error instanceof DOMException)) throw error
  }
}
