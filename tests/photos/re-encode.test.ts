import { deflateSync } from 'node:zlib'
import sharp from 'sharp'
import { expect, test } from 'vitest'
import { photoFormat } from '@/lib/photos/photo-format'
import { reEncode, type ReEncoded } from '@/lib/photos/re-encode'
import { colourAt, phonePhoto, picture } from '../support/pictures'

async function encoded(bytes: Uint8Array): Promise<ReEncoded> {
  const made = await reEncode(bytes)
  if (typeof made === 'string') throw new Error(`refused: ${made}`)
  return made
}

test.each([
  ['JPEG', 'jpeg', () => picture().jpeg().toBuffer()],
  ['PNG', 'png', () => picture().png().toBuffer()],
  ['WebP', 'webp', () => picture().webp().toBuffer()],
] as const)('a %s is taken by its first bytes and kept as a JPEG of its size', async (_, format, make) => {
  const bytes = await make()
  expect(photoFormat(bytes)).toBe(format)
  const { jpeg, width, height } = await encoded(bytes)

  expect([width, height]).toEqual([400, 300])
  expect(photoFormat(jpeg)).toBe('jpeg')
  expect([await colourAt(jpeg, 0.2, 0.5), await colourAt(jpeg, 0.8, 0.5)]).toEqual(['red', 'blue'])
})

test('nothing of what the phone wrote into the file comes out: no place, no owner, no profile', async () => {
  const sent = await phonePhoto()
  expect(sent.includes('CANARY-OWNER')).toBe(true)
  expect((await sharp(sent).metadata()).exif).toBeDefined()
  const { jpeg } = await encoded(sent)

  const { exif, icc, xmp, iptc, orientation } = await sharp(jpeg).metadata()
  expect([exif, icc, xmp, iptc, orientation]).toEqual([undefined, undefined, undefined, undefined, undefined])
  expect(Buffer.from(jpeg).includes('CANARY')).toBe(false)
})

test.each([
  [1, 400, 300, 'left'],
  [3, 400, 300, 'right'],
  [6, 300, 400, 'top'],
  [8, 300, 400, 'bottom'],
] as const)('a photograph held at EXIF orientation %i is kept upright', async (orientation, width, height, redAt) => {
  const made = await encoded(await phonePhoto({ orientation }))
  const places = { left: [0.1, 0.5], right: [0.9, 0.5], top: [0.5, 0.1], bottom: [0.5, 0.9] } as const
  const [x, y] = places[redAt]

  expect([made.width, made.height]).toEqual([width, height])
  expect(await colourAt(made.jpeg, x, y)).toBe('red')
})

test.each([
  [4000, 3000, 1600, 1200],
  [900, 3200, 450, 1600],
  [1600, 1600, 1600, 1600],
  [120, 90, 120, 90],
])('%i × %i is kept as %i × %i: never longer than 1600, never made larger', async (width, height, keptWidth, keptHeight) => {
  const made = await encoded(await picture(width, height).jpeg().toBuffer())

  expect([made.width, made.height]).toEqual([keptWidth, keptHeight])
})

test('what is transparent is kept on white', async () => {
  const clear = await sharp({ create: { width: 40, height: 40, channels: 4, background: { r: 0, g: 0, b: 0, alpha: 0 } } })
    .png()
    .toBuffer()
  const { data } = await sharp((await encoded(clear)).jpeg)
    .raw()
    .toBuffer({ resolveWithObject: true })

  expect(data[0]).toBeGreaterThan(250)
})

test.each([
  ['nothing', async () => Buffer.alloc(0)],
  ['text', async () => Buffer.from('a photo that is no photo')],
  ['an SVG', async () => Buffer.from('<svg xmlns="http://www.w3.org/2000/svg" width="9" height="9"><script>1</script></svg>')],
  ['a page', async () => Buffer.from('<!doctype html><script>alert(1)</script>')],
  ['a GIF', () => picture(8, 8).gif().toBuffer()],
  ['a TIFF', () => picture(8, 8).tiff().toBuffer()],
  ['an AVIF', () => picture(8, 8).avif().toBuffer()],
  ['a PDF', async () => Buffer.from('%PDF-1.7\n1 0 obj<<>>endobj')],
  ['RIFF that is no WebP', async () => Buffer.concat([Buffer.from('RIFF'), Buffer.alloc(4), Buffer.from('WAVE')])],
])('%s is no photograph', async (_, make) => {
  expect(await reEncode(await make())).toBe('photo-not-one')
})

test.each([
  ['a JPEG cut in half', async () => half(await phonePhoto())],
  ['a PNG cut in half', async () => half(await picture().png().toBuffer())],
  ['a WebP cut in half', async () => half(await picture().webp().toBuffer())],
  ['the first bytes of a JPEG and nothing more', async () => Buffer.from([0xff, 0xd8, 0xff, 0xe0])],
  ['a JPEG’s first bytes before a page', async () => Buffer.concat([Buffer.from([0xff, 0xd8, 0xff]), Buffer.from('<!doctype html>')])],
  ['a PNG’s first bytes before an SVG', async () => Buffer.concat([Buffer.from('\x89PNG\r\n\x1a\n', 'latin1'), Buffer.from('<svg/>')])],
])('%s is told as damaged', async (_, make) => {
  expect(await reEncode(await make())).toBe('photo-unreadable')
})

test('a picture of a few kilobytes that would unfold to gigabytes is refused before it does', async () => {
  const bomb = pngOf(40_000, 40_000, deflateSync(Buffer.alloc(1_000_000)))
  expect(bomb.byteLength).toBeLessThan(10_000)
  const before = process.memoryUsage().rss
  expect(await reEncode(bomb)).toBe('photo-too-many-pixels')
  expect(process.memoryUsage().rss - before).toBeLessThan(100_000_000)
})

test('fifty million pixels are the limit: one row more is refused', async () => {
  const row = (height: number) =>
    sharp({ create: { width: 10_000, height, channels: 3, background: 'white' } }).png({ compressionLevel: 9 })

  expect(typeof (await reEncode(await row(5_000).toBuffer()))).toBe('object')
  expect(await reEncode(await row(5_001).toBuffer())).toBe('photo-too-many-pixels')
})

test('what is hidden behind or inside a photograph does not come out', async () => {
  const behind = Buffer.concat([await phonePhoto(), Buffer.from('PK\x03\x04CANARY-ZIP<script>alert(1)</script>')])
  const inside = withComment(await picture().jpeg().toBuffer(), '<script>CANARY</script>'.repeat(2000))
  for (const sent of [behind, inside]) {
    expect(sent.includes('CANARY')).toBe(true)
    expect(Buffer.from((await encoded(sent)).jpeg).includes('CANARY')).toBe(false)
  }
})

test('a megabyte of metadata does not make what is kept any larger', async () => {
  let bloated = await picture().jpeg().toBuffer()
  const plain = (await encoded(bloated)).jpeg.byteLength
  for (let times = 0; times < 20; times += 1) bloated = Buffer.from(withComment(bloated, 'x'.repeat(60_000)))
  expect(bloated.byteLength).toBeGreaterThan(1_000_000)

  expect((await encoded(bloated)).jpeg.byteLength).toBe(plain)
})

function half(bytes: Buffer): Buffer {
  return bytes.subarray(0, bytes.byteLength / 2)
}

/** A JPEG with a comment segment after its first two bytes. */
function withComment(jpeg: Buffer, text: string): Buffer {
  const length = Buffer.alloc(2)
  length.writeUInt16BE(text.length + 2)
  return Buffer.concat([jpeg.subarray(0, 2), Buffer.from([0xff, 0xfe]), length, Buffer.from(text), jpeg.subarray(2)])
}

/** A PNG that claims a size, whatever its data holds. */
function pngOf(width: number, height: number, data: Buffer): Buffer {
  const head = Buffer.alloc(13)
  head.writeUInt32BE(width, 0)
  head.writeUInt32BE(height, 4)
  head.set([8, 2, 0, 0, 0], 8)
  return Buffer.concat([
    Buffer.from('\x89PNG\r\n\x1a\n', 'latin1'),
    chunk('IHDR', head),
    chunk('IDAT', data),
    chunk('IEND', Buffer.alloc(0)),
  ])
}

function chunk(type: string, data: Buffer): Buffer {
  const length = Buffer.alloc(4)
  length.writeUInt32BE(data.byteLength)
  const body = Buffer.concat([Buffer.from(type, 'latin1'), data])
  const sum = Buffer.alloc(4)
  sum.writeUInt32BE(crc32(body))
  return Buffer.concat([length, body, sum])
}

function crc32(bytes: Buffer): number {
  let sum = 0xffffffff
  for (const byte of bytes) {
    sum ^= byte
    for (let bit = 0; bit < 8; bit += 1) sum = sum & 1 ? (sum >>> 1) ^ 0xedb88320 : sum >>> 1
  }
  return (sum ^ 0xffffffff) >>> 0
}
