'use client'

import { useState } from 'react'
import { Button } from '@/app/_ui/button'
import { CODE_KEYS, TextKeys } from '@/app/_ui/text-keys'
import { parseTypedCode, TYPED_CODE_LENGTH } from '@/lib/pass/typed-code'

/** Keys for the eight signs under a sticker. A wrong or swapped sign is told at once, before anybody waits for an answer. */
export function CodePad({ onAsk }: { readonly onAsk: (code: string) => void }) {
  const [code, setCode] = useState('')
  const isWhole = code.length === TYPED_CODE_LENGTH
  const says = isWhole && parseTypedCode(code) === null ? 'A sign is wrong, or two are swapped.' : `${code.length} of ${TYPED_CODE_LENGTH}`
  return (
    <form
      className="grid gap-2"
      onSubmit={(event) => {
        event.preventDefault()
        if (!isWhole) return
        onAsk(code)
        setCode('')
      }}
    >
      <TextKeys
        label="Code under the sticker"
        value={code}
        onChange={setCode}
        keys={CODE_KEYS}
        maxLength={TYPED_CODE_LENGTH}
        judgement={says}
      />
      <Button type="submit" size="large" disabled={!isWhole}>
        Ask
      </Button>
    </form>
  )
}
