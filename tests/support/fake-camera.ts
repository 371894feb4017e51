import { writeFileSync } from 'node:fs'
import sharp from 'sharp'

export interface FakeCameraOptions {
  /** Where to write the film; its name must end in `.mjpeg`. */
  readonly file: string
  readonly width?: number
  readonly height?: number
  /** How much of the frame's shorter side the picture takes, 0 to 1. */
  readonly fills?: number
  /** Frames of the film; Chromium repeats it for ever. */
  readonly frames?: number
}

/** Makes a film that Chromium takes for a camera from a picture (PNG or SVG): held on grey, a little closer and further, as a hand does. Gives the file. */
export async function fakeCameraFrom(picture: Buffer | string, options: FakeCameraOptions): Promise<string> {
  const { file, width = 720, height = 1280, fills = 0.6, frames = 10 } = options
  const film: Buffer[] = []
  for (let frame = 0; frame < frames; frame++) {
    const side = Math.round(Math.min(width, height) * fills * (1 + 0.03 * Math.sin((2 * Math.PI * frame) / frames)))
    const held = await sharp(picture, { density: 300 })
      .resize(side, side, { fit: 'contain', background: '#fff' })
      .flatten({ background: '#fff' })
      .png()
      .toBuffer()
    const scene = sharp({ create: { width, height, channels: 3, background: '#7a7a7a' } }).composite([{ input: held, gravity: 'centre' }])
    film.push(await scene.jpeg({ quality: 92 }).toBuffer())
  }
  writeFileSync(file, Buffer.concat(film))
  return file
}
