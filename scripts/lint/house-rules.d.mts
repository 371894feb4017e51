import type { ESLint, Linter } from 'eslint'

export function banned(options: { readonly allow?: readonly string[]; readonly pure?: boolean }): Linter.RulesRecord
export const bannedFor: { readonly pure: Linter.RulesRecord }
export const houseRules: ESLint.Plugin
