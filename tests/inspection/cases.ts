import { CASES_1_TO_11 } from './cases-1-to-11'
import { CASES_12_TO_20 } from './cases-12-to-20'
import { CASES_21_TO_29 } from './cases-21-to-29'
import type { FoldCase } from './fold-case'

/** Every numbered case that the fold decides; 4, 17 and 30 belong to the sync and the pit exit. */
export const FOLD_CASES: readonly FoldCase[] = [...CASES_1_TO_11, ...CASES_12_TO_20, ...CASES_21_TO_29]
