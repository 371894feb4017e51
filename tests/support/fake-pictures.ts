import { Blob as NodeBlob } from 'node:buffer'
import { vi } from 'vitest'

/** What a browser gives and jsdom lacks: pictures that can be decoded, drawn and shown. What is drawn says in its bytes what was photographed. */
export function fakePictures(): void {
  vi.stubGlobal('createImageBitmap', async (file: Blob) => {
    const words = await file.text()
    if (!words.startsWith('picture')) throw new DOMException('no picture', 'InvalidStateError')
    return { width: 4032, height: 3024, words, close: () => undefined }
  })
  let drawn = ''
  const context = { fillRect: () => undefined, drawImage: ({ words }: { readonly words: string }) => (drawn = words) }
  vi.spyOn(HTMLCanvasElement.prototype, 'getContext').mockReturnValue(context as never)
  vi.spyOn(HTMLCanvasElement.prototype, 'toBlob').mockImplementation(function toBlob(this: HTMLCanvasElement, done) {
    // Node's own: jsdom's bytes are not what WebCrypto takes.
    done(new NodeBlob([`${drawn} at ${this.width} × ${this.height}`], { type: 'image/jpeg' }) as Blob)
  })
  let shown = 0
  URL.createObjectURL = () => `blob:picture-${(shown += 1)}`
  URL.revokeObjectURL = () => undefined
}

/** A file as an input gives it. */
export function aPicture(words: string): File {
  return new File([`picture of ${words}`], 'IMG_0001.jpg', { type: 'image/jpeg' })
}
