import type { Source } from '../judgement'

/** How a body takes a label: accepted to a last day (null: no end), not accepted, or not said in what we have read. */
export type Acceptance =
  { readonly is: 'accepted'; readonly until: string | null } | { readonly is: 'not-accepted' } | { readonly is: 'not-known' }

/** What kind of label it is: made for car racing, for motorcycles or karts, not for cars at speed, for another piece of kit, or none. */
export type HelmetKind = 'car' | 'motorcycle' | 'not-for-cars' | 'other-kit' | 'none'

export type HelmetBody = 'track-day' | 'asn-uk' | 'fia'

export interface HelmetStandard {
  /** As a person reads it off the label. */
  readonly label: string
  readonly kind: HelmetKind
  /** What the label itself says of the face: ECE P is full, J open, P/J full when worn closed; null where it says nothing. */
  readonly face: 'full' | 'open' | 'full-when-closed' | null
  readonly accepted: Readonly<Record<HelmetBody, Acceptance>>
}

const noEnd: Acceptance = { is: 'accepted', until: null }
const no: Acceptance = { is: 'not-accepted' }
const notKnown: Acceptance = { is: 'not-known' }
function until(day: string): Acceptance {
  return { is: 'accepted', until: day }
}

export const HELMET_STANDARD_IDS = [
  'fia-8859-2015',
  'fia-8859-2024',
  'fia-8860-2018',
  'fia-8860-2018-abp',
  'fia-8860-2010',
  'fia-8860-2004',
  'snell-sa2025',
  'snell-sa2020',
  'snell-sa2015',
  'snell-sa2010',
  'snell-sah2010',
  'snell-sa2005',
  'sfi-31.1-2015',
  'sfi-31.1-older',
  'ece-22.06-p',
  'ece-22.06-p-j',
  'ece-22.06-j',
  'ece-22.05-p',
  'ece-22.05-p-j',
  'ece-22.05-j',
  'snell-m',
  'snell-k',
  'snell-cm',
  'dot-only',
  'bs-6658-a-fr',
  'fia-8858',
  'fia-8856',
  'none-readable',
] as const
export type HelmetStandardId = (typeof HELMET_STANDARD_IDS)[number]

/** The choice "no second label" in the walk. */
export const NO_SECOND_LABEL = 'none'

/** Labels found in helmets, and in kit mistaken for them, in the order the walk lists them. */
export const HELMET_STANDARDS: Readonly<Record<HelmetStandardId, HelmetStandard>> = {
  'fia-8859-2015': car('FIA 8859-2015', noEnd, noEnd, noEnd),
  'fia-8859-2024': car('FIA 8859-2024', noEnd, notKnown, noEnd),
  'fia-8860-2018': car('FIA 8860-2018', noEnd, noEnd, noEnd),
  'fia-8860-2018-abp': car('FIA 8860-2018-ABP', noEnd, noEnd, noEnd),
  'fia-8860-2010': car('FIA 8860-2010', noEnd, until('2028-12-31'), until('2028-12-31')),
  'fia-8860-2004': car('FIA 8860-2004', noEnd, until('2020-12-31'), no),
  'snell-sa2025': car('Snell SA2025', noEnd, notKnown, notKnown),
  'snell-sa2020': car('Snell SA2020', noEnd, noEnd, notKnown),
  'snell-sa2015': car('Snell SA2015', noEnd, until('2026-12-31'), until('2023-12-31')),
  'snell-sa2010': car('Snell SA2010', until('2023-12-31'), until('2023-12-31'), until('2023-12-31')),
  'snell-sah2010': car('Snell SAH2010', until('2023-12-31'), until('2023-12-31'), until('2023-12-31')),
  'snell-sa2005': car('Snell SA2005', until('2018-12-31'), notKnown, until('2018-12-31')),
  'sfi-31.1-2015': car('SFI 31.1/2015 or newer', noEnd, notKnown, notKnown),
  'sfi-31.1-older': car('SFI 31.1, older or no year', no, notKnown, notKnown),
  'ece-22.06-p': ece('ECE 22.06, P (number begins 06)', 'full'),
  'ece-22.06-p-j': ece('ECE 22.06, P/J', 'full-when-closed'),
  'ece-22.06-j': ece('ECE 22.06, J (jet)', 'open'),
  'ece-22.05-p': ece('ECE 22.05, P (number begins 05)', 'full'),
  'ece-22.05-p-j': ece('ECE 22.05, P/J', 'full-when-closed'),
  'ece-22.05-j': ece('ECE 22.05, J (jet)', 'open'),
  'snell-m': {
    label: 'Snell M (motorcycle), any year',
    kind: 'motorcycle',
    face: null,
    accepted: { 'track-day': noEnd, 'asn-uk': no, fia: no },
  },
  'snell-k': {
    label: 'Snell K (karting), any year',
    kind: 'motorcycle',
    face: null,
    accepted: { 'track-day': noEnd, 'asn-uk': no, fia: no },
  },
  'snell-cm': {
    label: 'Snell CM (youth karting)',
    kind: 'not-for-cars',
    face: null,
    accepted: { 'track-day': noEnd, 'asn-uk': no, fia: no },
  },
  'dot-only': { label: 'DOT alone', kind: 'not-for-cars', face: null, accepted: { 'track-day': noEnd, 'asn-uk': no, fia: no } },
  'bs-6658-a-fr': car('BS 6658-85 type A/FR', until('2015-12-31'), until('2015-12-31'), until('2013-12-31')),
  'fia-8858': notAHelmet('FIA 8858 (2002 or 2010)'),
  'fia-8856': notAHelmet('FIA 8856'),
  'none-readable': { label: 'No label can be read', kind: 'none', face: null, accepted: { 'track-day': no, 'asn-uk': no, fia: no } },
}

function car(label: string, trackDay: Acceptance, asnUk: Acceptance, fia: Acceptance): HelmetStandard {
  return { label, kind: 'car', face: null, accepted: { 'track-day': trackDay, 'asn-uk': asnUk, fia } }
}

/** Road and motorcycle approval: taken on track days, by neither rule-maker for racing. */
function ece(label: string, face: HelmetStandard['face']): HelmetStandard {
  return { label, kind: 'car', face, accepted: { 'track-day': noEnd, 'asn-uk': no, fia: no } }
}

/** 8858 belongs to the posts of a head restraint, 8856 to clothing. */
function notAHelmet(label: string): HelmetStandard {
  return { label, kind: 'other-kit', face: null, accepted: { 'track-day': no, 'asn-uk': no, fia: no } }
}

export const HELMET_SOURCES: readonly Source[] = [
  {
    id: 'fia-tl25',
    title: 'FIA Technical List 25, recognised helmet standards, as summarised by a retailer',
    edition: '11 December 2024',
    confidence: 'second-hand',
  },
  {
    id: 'uk-club-helmets',
    title: 'UK sports-car club, chief scrutineer’s note on helmets and belts',
    edition: '2024',
    confidence: 'second-hand',
  },
  { id: 'msuk-helmets', title: 'Motorsport UK yearbook, section K10, helmets that took a blow', edition: '2024', confidence: 'quoted' },
  { id: 'uk-date-lives', title: 'UK club racer’s guide to date lives', edition: 'January 2021', confidence: 'second-hand' },
  {
    id: 'uk-joining',
    title: 'UK track-day joining instructions: full face in open cars, no motocross helmets',
    edition: '2010s',
    confidence: 'second-hand',
  },
  {
    id: 'scca-safety',
    title: 'SCCA time-trial and solo safety rules: SFI 31.1 and Snell M',
    edition: '2021–2024',
    confidence: 'second-hand',
  },
  {
    id: 'un-r22',
    title: 'Articles on the change from UN R22.05 to 22.06 and the P, J and P/J marks',
    edition: '2021–2024',
    confidence: 'second-hand',
  },
  { id: 'lockwire-helmet-age', title: 'Age limits of 10 and 5 years, labels taken on a track day', confidence: 'ours' },
]
