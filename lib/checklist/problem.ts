import type * as z from 'zod/mini'

/** One thing wrong with a checklist or a set of limits: where (`checks[3].reopens[0]`) and what, in words for whoever writes it. */
export interface Problem {
  readonly path: string
  readonly problem: string
}

/** Joins the parts of a path: `pathOf('checks', 3, 'reopens')` is `checks[3].reopens`. */
export function pathOf(...parts: readonly PropertyKey[]): string {
  return parts.reduce<string>((path, part) => {
    if (typeof part === 'number') return `${path}[${part}]`
    return path === '' ? String(part) : `${path}.${String(part)}`
  }, '')
}

/** What the schema has against a value, one problem per place. */
export function schemaProblems(issues: readonly z.core.$ZodIssue[]): Problem[] {
  return issues.map((issue) => ({ path: pathOf(...issue.path), problem: inWords(issue) }))
}

function inWords(issue: z.core.$ZodIssue): string {
  switch (issue.code) {
    case 'unrecognized_keys':
      return `has what no such entry may have: ${issue.keys.join(', ')}`
    case 'invalid_type':
      return issue.input === undefined ? `is missing, or is no ${issue.expected}` : `must be ${issue.expected}`
    case 'invalid_value':
      return `must be one of: ${issue.values.map(String).join(', ')}`
    case 'too_small':
      return `is too short or too small: at least ${issue.minimum}`
    case 'too_big':
      return `is too long or too large: at most ${issue.maximum}`
    case 'invalid_format':
      return 'is not written as such an id must be: lower-case letters, digits and hyphens'
    case 'invalid_union':
      return 'fits none of the forms allowed here'
    default:
      return issue.message
  }
}
