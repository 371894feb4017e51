import { findRule } from '@/lib/rules/registry'
import type { Checklist, Limits } from './checklist'
import { limitsSchema } from './checklist'
import type { Problem } from './problem'
import { pathOf, schemaProblems } from './problem'

export type ParsedLimits = { readonly ok: true; readonly limits: Limits } | { readonly ok: false; readonly problems: readonly Problem[] }

/**
 * Reads a set of limits against the rules themselves: every rule must be known, and what is set must make a complete set of limits over the
 * rule's defaults. All problems at once; never throws. Whether it fits a given checklist is asked of `limitsProblems`.
 */
export function parseLimits(json: unknown): ParsedLimits {
  const parsed = limitsSchema.safeParse(json)
  if (!parsed.success) return { ok: false, problems: schemaProblems(parsed.error.issues) }
  const problems = Object.entries(parsed.data.rules).flatMap(([name, set]) => {
    const rule = findRule(name)
    if (rule === null) return [{ path: pathOf('rules', name), problem: `there is no rule ${name}` }]
    return paramsProblems(name, { ...(rule.defaults as Record<string, unknown>), ...set })
  })
  return problems.length === 0 ? { ok: true, limits: parsed.data } : { ok: false, problems }
}

/** What these limits laid over that checklist's own make that its rules would not take; to be empty before an event uses the two together. */
export function limitsProblems(checklist: Checklist, limits: Limits): Problem[] {
  return checklist.checks.flatMap((check) => {
    if (check.rule === undefined) return []
    const params = { ...check.rule.params, ...limits.rules[check.rule.name] }
    return paramsProblems(check.rule.name, params).map((each) => ({ ...each, problem: `${each.problem} (at the check ${check.id})` }))
  })
}

function paramsProblems(name: string, params: Record<string, unknown>): Problem[] {
  const parsed = findRule(name)?.params.safeParse(params)
  if (parsed === undefined || parsed.success) return []
  return schemaProblems(parsed.error.issues).map((each) => ({
    ...each,
    path: each.path === '' ? pathOf('rules', name) : `${pathOf('rules', name)}.${each.path}`,
  }))
}
