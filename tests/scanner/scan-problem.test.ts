import { expect, test } from 'vitest'
import { scanProblem } from '@/lib/scanner/scan-problem'

test.each(['insecure', 'no-camera', 'refused', 'busy', 'decoder'] as const)(
  '%s says what happened, what still works and what to do',
  (code) => {
    const { happened, kept, todo } = scanProblem(code)

    for (const sentence of [happened, kept, todo]) expect(sentence).toMatch(/^[A-Z].+[.]$/)
  },
)
