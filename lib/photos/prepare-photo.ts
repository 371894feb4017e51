import { photoTries, SENT_LIMIT_BYTES, type PhotoTry } from './photo-tries'

/** A photograph as it is kept on the phone and sent: its name is the hash of exactly these bytes. */
export interface PreparedPhoto {
  /** SHA-256, lower-case hex. */
  readonly hash: string
  /** JPEG. */
  readonly blob: Blob
  readonly width: number
  readonly height: number
}

export interface PhotoProblem {
  readonly what: string
  readonly kept: string
  readonly todo: string
}

const NOT_ONE: PhotoProblem = {
  what: 'What was chosen is no photograph that this device can read.',
  kept: 'What was entered before is still here.',
  todo: 'Take a photograph with the camera, or choose a JPEG or PNG.',
}
const NO_MEMORY: PhotoProblem = {
  what: 'This device could not draw the photograph, perhaps for lack of memory.',
  kept: 'What was entered before is still here.',
  todo: 'Close other pages and take it again, smaller if the camera can.',
}

/**
 * Draws what a camera or a gallery gave anew: upright, at most 1600 px and 300 KB, and with nothing of what the phone wrote into the file
 * (place, owner, time). In the browser only. Gives words where it is no picture.
 */
export async function preparePhoto(file: Blob): Promise<PreparedPhoto | PhotoProblem> {
  let bitmap: ImageBitmap
  try {
    bitmap = await createImageBitmap(file, { imageOrientation: 'from-image' })
  } catch {
    // Every browser names it otherwise; for the person it is one thing.
    return NOT_ONE
  }
  try {
    for (const size of photoTries(bitmap.width, bitmap.height)) {
      const blob = await draw(bitmap, size)
      if (blob === null) return NO_MEMORY
      if (blob.size <= SENT_LIMIT_BYTES) return { hash: await hashOf(blob), blob, width: size.width, height: size.height }
    }
    return NO_MEMORY
  } finally {
    bitmap.close()
  }
}

export function isPhotoProblem(result: PreparedPhoto | PhotoProblem): result is PhotoProblem {
  return 'what' in result
}

async function draw(bitmap: ImageBitmap, { width, height, quality }: PhotoTry): Promise<Blob | null> {
  const canvas = document.createElement('canvas')
  canvas.width = width
  canvas.height = height
  const context = canvas.getContext('2d', { alpha: false })
  if (context === null) return null
  // A picture with holes would show black where a JPEG cannot be clear.
  context.fillStyle = 'white'
  context.fillRect(0, 0, width, height)
  context.imageSmoothingQuality = 'high'
  context.drawImage(bitmap, 0, 0, width, height)
  const blob = await new Promise<Blob | null>((done) => canvas.toBlob(done, 'image/jpeg', quality))
  // Safari keeps a canvas's memory until it is drawn small.
  canvas.width = canvas.height = 0
  return blob
}

async function hashOf(blob: Blob): Promise<string> {
  const digest = await crypto.subtle.digest('SHA-256', await blob.arrayBuffer())
  return [...new Uint8Array(digest)].map((byte) => byte.toString(16).padStart(2, '0')).join('')
}
