import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { qrText, readQrText } from '@/lib/pass/qr-text'
import { aToken } from './a-pit-exit'

const token = aToken()

describe('the text of a sticker’s code', () => {
  test.each([
    ['https://paddock.example', `HTTPS://PADDOCK.EXAMPLE/P/${token}`],
    ['http://192.168.4.20:3000', `HTTP://192.168.4.20:3000/P/${token}`],
    ['https://paddock.example/', `HTTPS://PADDOCK.EXAMPLE/P/${token}`],
  ])('of %s is all upper case and in the alphanumeric set', (origin, expected) => {
    expect(qrText(origin, token)).toBe(expected)
    expect(qrText(origin, token)).toMatch(/^[A-Z0-9 $%*+./:-]+$/)
  })

  test('is the bare token where the origin makes no link that could be read again', () => {
    expect(['', 'paddock', 'https://paddock.example/club'].map((origin) => qrText(origin, token))).toEqual([token, token, token])
  })

  test.each([
    ['as printed', qrText('https://paddock.example', token)],
    ['by any host', qrText('http://localhost:3000', token)],
    ['with /p/ in lower case', `https://paddock.example/p/${token}`],
    ['all in lower case', `https://paddock.example/p/${token.toLowerCase()}`],
    ['as the bare token', token],
    ['with space around it', `  ${token}\n`],
  ])('is read %s', (_, text) => {
    expect(readQrText(text)).toEqual({ kind: 'token', token })
  })

  const foreign: readonly (readonly [string, string])[] = [
    ['nothing', ''],
    ['spaces', ' \n\t '],
    ['a link', 'https://tickets.example/a?b=c'],
    ['a script', 'javascript:alert(document.cookie)'],
    ['data', `data:text/html,<script>fetch('//x.example')</script>`],
    ['a telephone number', 'tel:+441632960001'],
    ['a network', 'WIFI:T:WPA;S:pits;P:secret;;'],
    ['a token by another path', `https://paddock.example/q/${token}`],
    ['a token with a query', `https://paddock.example/p/${token}?next=//x.example`],
    ['a token with a name before the host', `https://admin:pw@paddock.example/p/${token}`],
    ['a token one character short', `https://paddock.example/p/${token.slice(1)}`],
    ['a token one character long', `${token}A`],
    ['two tokens', `${token}\n${token}`],
    ['a token with a zero byte', `${token.slice(1)}\u0000`],
    ['a token with a sign that only looks like an S', `${token.slice(0, 60)}ſ${token.slice(61)}`],
    ['text that runs right to left', '\u202Eelpmaxe.kcoddap//:sptth'],
    ['control characters', '\u001b[2J\u0007PASSED'],
    ['half a character', '\uD83C'],
    ['a book', 'A'.repeat(1_000_000)],
    ['a book of spaces', ' '.repeat(1_000_000)],
    ['the word PASSED', 'PASSED'],
  ]

  test.each(foreign)('%s is foreign, and nothing of it is shown', (_, text) => {
    const read = readQrText(text)
    expect(read.kind).toBe('foreign')
    expect(read.kind === 'foreign' && read.shownAs).toMatch(
      /^(an empty code|(a link that is not ours|some other text) \(\d+ characters\))$/,
    )
  })

  test('any text is answered for, none throws, and none of a foreign one is shown', () => {
    fc.assert(
      fc.property(fc.string({ unit: 'binary', maxLength: 600 }), (text) => {
        const read = readQrText(text)
        if (read.kind === 'foreign') expect(read.shownAs).toMatch(/^[a-z ]+(\(\d+ characters\))?$/)
        else expect(read.token).toMatch(/^[A-Z2-7]{133}$/)
      }),
      { numRuns: 1_000 },
    )
  })
})
