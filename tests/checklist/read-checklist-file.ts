import { readFileSync } from 'node:fs'

const FOLDER = new URL('../../checklists/', import.meta.url)

/** Text of a shipped file under `checklists/`. */
export function checklistText(path: string): string {
  return readFileSync(new URL(path, FOLDER), 'utf8')
}

/** A shipped file, parsed as JSON and nothing more. */
export function checklistJson(path: string): unknown {
  return JSON.parse(checklistText(path))
}
