import sharp from 'sharp'

/** A picture of this size that says something: left half red, right half blue. */
export function picture(width = 400, height = 300) {
  const half = { create: { width: Math.ceil(width / 2), height, channels: 3, background: '#d01020' } } as const
  return sharp({ create: { width, height, channels: 3, background: '#1020d0' } }).composite([{ input: half, left: 0, top: 0 }])
}

/** What a phone's camera makes: its place, its owner and its orientation are in the file. */
export async function phonePhoto({ width = 400, height = 300, orientation = 1 } = {}): Promise<Buffer> {
  return picture(width, height)
    .jpeg()
    .withExif({
      IFD0: { Artist: 'CANARY-OWNER', ImageDescription: 'CANARY-WORDS', Make: 'Fernlight' },
      IFD3: { GPSLatitudeRef: 'N', GPSLatitude: '51/1 28/1 40/1', GPSLongitudeRef: 'W', GPSLongitude: '2/1 30/1 0/1' },
    })
    .withMetadata({ orientation })
    .toBuffer()
}

/** Which colour stands at a place of a picture, by its parts of width and height. */
export async function colourAt(bytes: Uint8Array, x: number, y: number): Promise<'red' | 'blue' | 'other'> {
  const { data, info } = await sharp(bytes).raw().toBuffer({ resolveWithObject: true })
  const at = (Math.floor(y * info.height) * info.width + Math.floor(x * info.width)) * info.channels
  const [red = 0, , blue = 0] = data.subarray(at, at + 3)
  if (red > 150 && blue < 100) return 'red'
  return blue > 150 && red < 100 ? 'blue' : 'other'
}
