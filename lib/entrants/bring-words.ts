/** What to do about something that would not be passed, by the rule that says so. */
const BRING: Readonly<Record<string, string>> = {
  'harness-validity': 'Bring belts whose labels are in date, or have the road belts fitted again.',
  'helmet-standard': 'Bring a helmet with a label that is accepted here.',
  'tyre-age': 'Come on younger tyres, the same on both sides of an axle.',
  'tyre-tread': 'Come on tyres with more tread, the same on both sides of an axle.',
}

/** What to bring or to do; general words where nothing special is known. */
export function bringWords(ruleName: string | undefined): string {
  return BRING[ruleName ?? ''] ?? 'Put it right before you travel, and bring what shows it: an invoice, a label, a photograph.'
}
