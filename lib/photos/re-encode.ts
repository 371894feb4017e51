import 'server-only'
import sharp from 'sharp'
import { PHOTO_LONGEST_PX } from '@/lib/contracts/photos'
import { photoFormat } from './photo-format'

/** More pixels than this are not decoded: a few kilobytes can unfold to gigabytes. */
export const PHOTO_LIMIT_PIXELS = 50_000_000
/** Longer than any honest photograph takes, seconds. */
const PATIENCE_SECONDS = 20
const QUALITY = 80

export interface ReEncoded {
  readonly jpeg: Uint8Array
  readonly width: number
  readonly height: number
}
export type PhotoFault = 'photo-not-one' | 'photo-unreadable' | 'photo-too-many-pixels'

// Only these may ever decode what strangers send; the library knows many more formats, and programs hidden in some of them.
sharp.block({ operation: ['VipsForeignLoad'] })
sharp.unblock({ operation: ['VipsForeignLoadJpegBuffer', 'VipsForeignLoadPngBuffer', 'VipsForeignLoadWebpBuffer'] })
// Nothing is decoded twice, and one photograph at a time is work enough for one thread: requests run beside each other already.
sharp.cache(false)
sharp.concurrency(1)

/**
 * Decodes a JPEG, PNG or WebP and draws it anew: a JPEG of at most 1600 px, upright, with no metadata and nothing else that was hidden in the file.
 * Gives a fault for what is none, is damaged or cut short, or is too large to unfold.
 */
export async function reEncode(bytes: Uint8Array): Promise<ReEncoded | PhotoFault> {
  const format = photoFormat(bytes)
  if (format === null) return 'photo-not-one'
  try {
    const image = sharp(bytes, { limitInputPixels: PHOTO_LIMIT_PIXELS, failOn: 'error', sequentialRead: true })
    const { format: decoder, width, height } = await image.metadata()
    if (decoder !== format) return 'photo-not-one'
    if (width * height > PHOTO_LIMIT_PIXELS) return 'photo-too-many-pixels'
    const { data, info } = await image
      .autoOrient()
      .resize({ width: PHOTO_LONGEST_PX, height: PHOTO_LONGEST_PX, fit: 'inside', withoutEnlargement: true })
      .flatten({ background: 'white' })
      .toColourspace('srgb')
      .jpeg({ quality: QUALITY })
      .timeout({ seconds: PATIENCE_SECONDS })
      .toBuffer({ resolveWithObject: true })
    return { jpeg: data, width: info.width, height: info.height }
  } catch (error) {
    // The library throws plain errors for whatever is wrong with the bytes; a limit is told by its words only.
    return error instanceof Error && /pixel limit/i.test(error.message) ? 'photo-too-many-pixels' : 'photo-unreadable'
  }
}
