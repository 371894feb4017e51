import type { Source } from '../judgement'

/** How the last valid day of a harness is found from its label. */
export type HarnessDating = 'not-valid-after-year' | 'years-from-made' | 'undated' | 'unreadable'

export interface HarnessStandard {
  readonly id: string
  /** As a person reads it off the strap. */
  readonly label: string
  readonly dating: HarnessDating
}

export const HARNESS_STANDARD_IDS = [
  'fia-8853-2016',
  'fia-8853-98',
  'fia-8854-98',
  'sfi-16.1',
  'sfi-16.5',
  'sfi-16.6',
  'un-r16',
  'none-readable',
] as const
export type HarnessStandardId = (typeof HARNESS_STANDARD_IDS)[number]

/** The standards a harness or belt may carry, in the order the walk lists them. */
export const HARNESS_STANDARDS: Readonly<Record<HarnessStandardId, HarnessStandard>> = {
  'fia-8853-2016': { id: 'fia-8853-2016', label: 'FIA 8853-2016', dating: 'not-valid-after-year' },
  'fia-8853-98': { id: 'fia-8853-98', label: 'FIA 8853/98', dating: 'not-valid-after-year' },
  'fia-8854-98': { id: 'fia-8854-98', label: 'FIA 8854/98', dating: 'not-valid-after-year' },
  'sfi-16.1': { id: 'sfi-16.1', label: 'SFI 16.1', dating: 'years-from-made' },
  'sfi-16.5': { id: 'sfi-16.5', label: 'SFI 16.5', dating: 'years-from-made' },
  'sfi-16.6': { id: 'sfi-16.6', label: 'SFI 16.6 (youth)', dating: 'years-from-made' },
  'un-r16': { id: 'un-r16', label: 'UN R16 road belt (E in a circle)', dating: 'undated' },
  'none-readable': { id: 'none-readable', label: 'No label can be read', dating: 'unreadable' },
}

export const HARNESS_SOURCES: readonly Source[] = [
  {
    id: 'msuk-ncr-7-7',
    title: 'Motorsport UK National Competition Rules, chapter 7 appendix 7',
    edition: '2025 v11',
    where: 'art. 10.4–10.8',
    confidence: 'quoted',
  },
  { id: 'msnz-belts', title: 'New Zealand motorsport guidance on belt labels', edition: '2017–2020', confidence: 'second-hand' },
  {
    id: 'uk-historic-notice',
    title: 'UK historic club notice: FIA 8853/98 ends under Appendix J',
    edition: '2022',
    confidence: 'second-hand',
  },
  {
    id: 'scca-rm04-01',
    title: 'SCCA general competition rules, section 20, and memo RM04-01',
    edition: '2002–2005',
    confidence: 'second-hand',
  },
  { id: 'un-r16', title: 'UN Regulation 16: road belts carry no end date', confidence: 'from memory: confirm' },
]
