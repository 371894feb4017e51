import { describe, expect, test } from 'vitest'
import { detectEncoding, isUtf8 } from '@/lib/entries/detect-encoding'
import { NO_CHOICES, readEntryList } from '@/lib/entries/read-entry-list'
import { aLine, aList, fixture, HEAD } from '../support/a-list'

const text = (said: string) => new TextEncoder().encode(said)
const joined = (...parts: readonly (readonly number[] | Uint8Array)[]) => Uint8Array.from(parts.flatMap((part) => [...part]))
const utf16 = (said: string, bigEnd: boolean) => {
  const little = Buffer.from(said, 'utf16le')
  return new Uint8Array(bigEnd ? little.swap16() : little)
}
const LIST = `${HEAD}\n${aLine({ surname: 'Zoe' })}\n`

describe('how a list is written', () => {
  test.each([
    ['UTF-8 with its mark', joined([0xef, 0xbb, 0xbf], text(LIST)), { encoding: 'utf-8', bom: 3 }],
    ['UTF-8 without', text(LIST.replace('Zoe', 'Žižka')), { encoding: 'utf-8', bom: 0 }],
    ['UTF-16, little end first', joined([0xff, 0xfe], utf16(LIST, false)), { encoding: 'utf-16le', bom: 2 }],
    ['UTF-16, big end first', joined([0xfe, 0xff], utf16(LIST, true)), { encoding: 'utf-16be', bom: 2 }],
    ['UTF-16 without a mark', utf16(LIST, false), { encoding: 'utf-16le', bom: 0 }],
    ['UTF-16 big end without a mark', utf16(LIST, true), { encoding: 'utf-16be', bom: 0 }],
    ['Windows-1252', joined(text('No;Name\n1;Zo'), [0xeb]), { encoding: 'windows-1252', bom: 0 }],
    ['bytes that UTF-8 forbids', joined(text('1;'), [0xc0, 0x80]), { encoding: 'windows-1252', bom: 0 }],
  ])('%s is found', (_, bytes, found) => {
    expect(detectEncoding(bytes)).toEqual({ kind: 'text', ...found })
  })

  test.each([
    ['an xlsx', [0x50, 0x4b, 0x03, 0x04, 0x14]],
    ['an xls', [0xd0, 0xcf, 0x11, 0xe0]],
    ['a PDF', [...text('%PDF-1.7')]],
    ['null bytes here and there', [0x31, 0x3b, 0x00, 0x32, 0x00, 0x00]],
  ])('%s is refused with what to do', (_, bytes) => {
    expect(readEntryList(Uint8Array.from(bytes)).problems).toMatchObject([
      { why: expect.stringContaining('Save the list as CSV') as string },
    ])
  })

  test.each([
    [[0x41], true],
    [[0xc3, 0xa9], true],
    [[0xc3], false],
    [[0xc1, 0x81], false],
    [[0xe0, 0x80, 0x80], false],
    [[0xed, 0xa0, 0x80], false],
    [[0xf0, 0x9f, 0x8f, 0x81], true],
    [[0xf4, 0x90, 0x80, 0x80], false],
    [[0x80], false],
  ])('bytes %o are sound UTF-8: %s', (bytes, sound) => {
    expect(isUtf8(Uint8Array.from(bytes))).toBe(sound)
  })

  test('the letters of Windows-1252 come out right, curly signs too', () => {
    const list = readEntryList(
      joined(
        text(`${HEAD}\n`),
        text(aLine({ firstName: 'Zo*', surname: 'O~Brien' })).map((byte) => ({ 0x2a: 0xeb, 0x7e: 0x92 })[byte] ?? byte),
      ),
    )
    expect(list.encoding).toBe('windows-1252')
    expect(list.rows[0]?.name).toBe('Zoë O’Brien')
  })

  test('whoever sees wrong letters chooses the writing by hand', () => {
    const bytes = text(`${HEAD}\n${aLine({ surname: 'Åsén' })}`)
    expect(readEntryList(bytes, { ...NO_CHOICES, encoding: 'windows-1252' }).rows[0]?.name).toBe('Ada Ã…sÃ©n')
    expect(readEntryList(bytes).rows[0]?.name).toBe('Ada Åsén')
  })
})

describe('rows and cells', () => {
  test.each([
    [';', ';'],
    ['\t', '\t'],
    [',', ','],
    ['|', '|'],
  ])('the separator %o is found by itself, under title lines too', (_, separator) => {
    const said = [HEAD, aLine({ number: '8', plate: 'AA1' }), aLine()].map((line) => line.replaceAll(',', separator)).join('\n')
    const list = readEntryList(text(`Ottermere Ring, spring; first list\n\n${said}`))
    expect(list.separator).toBe(separator)
    expect(list.headingRow).toBe(3)
    expect(list.rows.map(({ row, number }) => [row, number])).toEqual([
      [4, '8'],
      [5, '7'],
    ])
    expect(list.remarks[0]?.words).toContain('stands above the headings')
  })

  test('a spreadsheet’s sep= line is obeyed and passed over', () => {
    const list = readEntryList(text(`sep=;\n${HEAD.replaceAll(',', ';')}\n${aLine().replaceAll(',', ';')}`))
    expect([list.separator, list.rows.length, list.headingRow]).toEqual([';', 1, 2])
  })

  test('a problem names the row that the spreadsheet shows, with empty rows and broken lines above it', () => {
    const broken = aLine({ number: '', plate: 'GF91 VGN' })
    const list = readEntryList(text(`\n${HEAD}\n\n${aLine({ note: '"quiet\non tyres"' })}\n,,,,,,,,,,\n${broken}\n`))
    expect(list.problems).toMatchObject([{ row: 6, column: 'entry number' }])
    expect(list.rows).toMatchObject([{ row: 4, number: '7', note: 'quiet on tyres' }])
    expect(list.rowCount).toBe(2)
  })

  test('rows may end in several ways in one list', () => {
    const [second, third] = ['8', '9'].map((number) => aLine({ number, plate: `GF9${number}` }))
    const list = readEntryList(text(`${HEAD}\r\n${aLine()}\r\n${second ?? ''}\n${third ?? ''}\r`))
    expect(list.rows.map(({ row, number }) => [row, number])).toEqual([
      [2, '7'],
      [3, '8'],
      [4, '9'],
    ])
  })

  test('007 is not 7', () => {
    expect(readEntryList(aList(aLine(), aLine({ number: '007', plate: 'GF91' }))).rows.map(({ number }) => number)).toEqual(['7', '007'])
  })

  test.each([
    ['no number', aLine({ number: '' }), 'entry number'],
    ['a number with a sign', aLine({ number: '7#' }), 'entry number'],
    ['an address that is none', aLine({ email: 'not-an-address' }), 'e-mail'],
    ['no plate', aLine({ plate: '' }), 'plate'],
    ['a plate that is a formula', aLine({ plate: '=1+1' }), 'plate'],
    ['no car', aLine({ model: '' }), 'car'],
    ['passengers in words', aLine({ passengerSeats: 'one' }), 'passengers'],
    ['nine passengers', aLine({ passengerSeats: '9' }), 'passengers'],
    ['a negative number of passengers', aLine({ passengerSeats: '-1' }), 'passengers'],
    ['no group', aLine({ group: '' }), 'run group'],
    ['a name that is missing', aLine({ firstName: '', surname: '' }), 'surname'],
    ['a note without end', aLine({ note: 'x'.repeat(501) }), 'notes'],
    ['two cells that ran together', aLine({ model: 'x'.repeat(81) }), 'car'],
    ['a cell too many', `${aLine()},extra`, ''],
  ])('%s is refused with row and column, and the row is left out', (_, line, column) => {
    const list = readEntryList(aList(line))
    expect(list.problems).toMatchObject([{ row: 2, column }])
    expect(list.problems[0]?.why).not.toBe('')
    expect(list.rows).toEqual([])
  })

  test('a row that stops early is read as far as it goes', () => {
    expect(readEntryList(aList('7,Ada,Norcott,,,Tessier Petite,red,GF90,Novice')).rows).toMatchObject([{ passengerSeats: 0, note: '' }])
  })

  test('a quotation mark that is never closed is one problem, not hundreds', () => {
    expect(readEntryList(aList(aLine({ note: '"open' }), aLine({ number: '8' }))).problems).toMatchObject([
      { row: 2, why: expect.stringContaining('never closed') as string },
    ])
  })

  test('a formula is text, and what cannot be seen is taken out and said', () => {
    const list = readEntryList(
      aList(
        aLine({ note: '"=HYPERLINK(""http://example.org/"")"' }),
        aLine({ number: '8', plate: 'AB\u200b1', note: '\u202eright to left\u202c' }),
      ),
    )
    expect(list.rows.map(({ note, plate }) => [note, plate])).toEqual([
      ['=HYPERLINK("http://example.org/")', 'GF90 VGN'],
      ['right to left', 'AB1'],
    ])
    expect(list.remarks).toMatchObject([{ row: 3 }])
  })

  test('a line of totals is passed over and said; a driver of that name is not', () => {
    const list = readEntryList(aList(aLine({ surname: 'Total' }), 'Total,,,,,,,,,97,'))
    expect(list.rows).toHaveLength(1)
    expect(list.remarks).toMatchObject([{ row: 3 }])
    expect(list.problems).toEqual([])
  })

  test('a cell put right by hand is read instead, a row left out is not read', () => {
    const corrections = [{ row: 2, column: 'email', value: 'ada@example.org' }] as const
    const list = readEntryList(aList(aLine({ email: 'ada' }), aLine({ number: '' })), { ...NO_CHOICES, corrections, leftOut: [3] })
    expect(list.problems).toEqual([])
    expect(list.rows).toMatchObject([{ email: 'ada@example.org' }])
    expect(list.remarks).toMatchObject([{ row: 3, words: 'Left out, as you said.' }])
  })

  test('more than ten thousand rows are refused as a whole', () => {
    expect(readEntryList(aList(...Array.from({ length: 10_001 }, () => aLine()))).problems).toMatchObject([
      { why: expect.stringContaining('10000 is the most') as string },
    ])
  })
})

describe('columns', () => {
  test.each([
    ['German', 'Startnummer;Vorname;Nachname;E-Mail;Handy;Fahrzeug;Farbe;Kennzeichen;Gruppe;Mitfahrer;Bemerkung'],
    ['French', 'N°;Prénom;Nom;Courriel;Portable;Véhicule;Couleur;Immatriculation;Groupe;Passagers;Remarques'],
    ['Spanish', 'Dorsal;Nombre;Apellidos;Correo electrónico;Móvil;Coche;Color;Matrícula;Grupo;Pasajeros;Observaciones'],
    ['Dutch', 'Startnummer;Voornaam;Achternaam;E-mailadres;Mobiel;Auto;Kleur;Kenteken;Groep;Passagiers;Opmerkingen'],
    ['Swedish', 'Startnummer;Förnamn;Efternamn;E-post;Mobil;Bil;Färg;Registreringsnummer;Grupp;Passagerare;Anteckning'],
    ['Polish', 'Numer startowy;Imię;Nazwisko;Adres e-mail;Telefon;Samochód;Kolor;Nr rejestracyjny;Grupa;Pasażerowie;Uwagi'],
  ])('%s headings are known outright', (_, head) => {
    const list = readEntryList(text(`${head}\n${aLine().replaceAll(',', ';')}`))
    expect(list.columns.map(({ column }) => column)).toEqual([
      'number',
      'firstName',
      'surname',
      'email',
      'mobile',
      'model',
      'colour',
      'plate',
      'group',
      'passengerSeats',
      'note',
    ])
    expect(list.columnsNeeded).toBe(false)
    expect(list.rows).toHaveLength(1)
  })

  test('an Italian list in which cognome is apellido’s sister: whole names and make beside model', () => {
    const list = readEntryList(text('Numero gara;Pilota;Marca;Modello;Targa;Gruppo\n12;Ciro Inkpen;Tessier;Petite R;AB 123;Novice'))
    expect(list.rows).toMatchObject([{ number: '12', name: 'Ciro Inkpen', model: 'Tessier Petite R' }])
  })

  test.each([
    ['two columns for one thing', HEAD.replace('Notes', 'Phone'), 'mobile'],
    ['a heading that only holds a known word', HEAD.replace('Reg,', 'Registration of the car today,'), 'plate'],
    ['Name beside a first name', HEAD.replace('Surname', 'Name'), 'surname'],
  ])('%s is a guess: it is told, and put to the organiser first', (_, head, column) => {
    const list = readEntryList(text(`${head}\n${aLine()}`))
    expect(list.columnsNeeded).toBe(true)
    expect(list.columns.filter(({ sure }) => sure === 'likely').map((one) => one.column)).toContain(column)
  })

  test('an address is known by what stands under a heading that says nothing', () => {
    const list = readEntryList(text(`${HEAD.replace('E-mail', 'Kontakt')}\n${aLine()}`))
    expect(list.columns[3]).toMatchObject({ column: 'email', sure: 'likely', samples: ['ada@example.org'] })
  })

  test('without a needed column nothing is read until the organiser says which it is', () => {
    const bytes = text(`${HEAD.replace('Reg,', 'XYZ,')}\n${aLine()}`)
    const asked = readEntryList(bytes)
    expect([asked.columnsNeeded, asked.rows, asked.problems]).toEqual([true, [], []])
    const columns = asked.columns.map(({ heading, column }) => (heading === 'XYZ' ? ('plate' as const) : column))
    const told = readEntryList(bytes, { ...NO_CHOICES, columns })
    expect([told.columnsNeeded, told.rows.length]).toEqual([false, 1])
  })

  test('a list without headings is mapped by hand', () => {
    const columns = [
      'number',
      'firstName',
      'surname',
      'email',
      'mobile',
      'model',
      'colour',
      'plate',
      'group',
      'passengerSeats',
      'note',
    ] as const
    expect(readEntryList(text(aLine()), { ...NO_CHOICES, headingRow: 0, columns }).rows).toMatchObject([{ row: 1, number: '7' }])
  })
})

describe('the lists of the trade', () => {
  test('the demo list of 142 is read whole and without a problem', () => {
    const list = readEntryList(fixture('entries-clean'))
    expect(list.problems).toEqual([])
    expect(list.rows).toHaveLength(142)
  })

  test('the tabbed list of 60 is read whole', () => {
    const list = readEntryList(fixture('entries-windows-1252'))
    expect([list.separator, list.problems.length, list.rows.length, list.columnsNeeded]).toEqual(['\t', 0, 60, false])
  })

  test('every bad cell of the messy list is named, and nothing else', () => {
    const list = readEntryList(fixture('entries-messy'))
    expect(list.problems.map(({ row, column }) => [row, column])).toEqual([
      [7, 'e-mail'],
      [20, 'entry number'],
      [21, 'passengers'],
      [22, 'passengers'],
      [29, 'car'],
      [30, 'notes'],
    ])
    const byRow = new Map(list.rows.map((row) => [row.row, row]))
    expect(byRow.get(16)?.name).toBe('Zoë Žižka-O’Brien')
    expect(byRow.get(17)?.note).toBe('two lines in one cell')
    expect(byRow.get(18)?.model).toBe('Corvane S2, "track" trim')
    expect(byRow.get(28)?.number).toBe('007')
    expect(byRow.get(27)?.name).toBe('Ada Gosling')
    expect(byRow.get(15)?.note).toContain('=HYPERLINK')
    expect(list.remarks.map(({ row }) => row)).toEqual([23, 99])
  })
})
