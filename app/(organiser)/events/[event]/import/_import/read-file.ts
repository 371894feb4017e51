import { detectEncoding } from '@/lib/entries/detect-encoding'
import { LARGEST_LIST_BASE64 } from '@/lib/contracts/entry-import'

/** The list that was chosen: its bytes as they are. What they mean is found out by the server. */
export interface ChosenList {
  readonly fileName: string
  readonly bytes: number
  readonly base64: string
}

export interface UnreadableFile {
  readonly fileName: string
  readonly why: string
  readonly todo: string
}

const LARGEST_BYTES = Math.floor((LARGEST_LIST_BASE64 * 3) / 4) - 3
/** A whole number of three-byte groups, so that the parts in base64 can be put together. */
const PART = 96 * 1024

/** Reads a file part by part, telling how far it is. */
export async function readFile(file: File, onPart: (bytesRead: number) => void): Promise<ChosenList | UnreadableFile> {
  const { name: fileName, size: bytes } = file
  if (bytes > LARGEST_BYTES)
    return {
      fileName,
      why: `The file has ${sizeInWords(bytes)}; ${sizeInWords(LARGEST_BYTES)} is the most.`,
      todo: 'Split the list and import the parts.',
    }
  const parts: string[] = []
  for (let from = 0; from < bytes; from += PART) {
    const part = new Uint8Array(await file.slice(from, from + PART).arrayBuffer())
    const found = from === 0 ? detectEncoding(part.subarray(0, 4_096)) : null
    if (found?.kind === 'not-text')
      return { fileName, why: `This is ${found.what}.`, todo: 'Save the list as CSV (UTF-8) in your spreadsheet and choose that file.' }
    parts.push(base64Of(part))
    onPart(Math.min(from + PART, bytes))
  }
  return { fileName, bytes, base64: parts.join('') }
}

function base64Of(bytes: Uint8Array): string {
  let binary = ''
  for (let from = 0; from < bytes.length; from += 8_192) binary += String.fromCharCode(...bytes.subarray(from, from + 8_192))
  return btoa(binary)
}

/** `412 bytes`, `14 KB`, `2.1 MB`. */
export function sizeInWords(bytes: number): string {
  if (bytes < 1_000) return `${bytes} bytes`
  return bytes < 1_000_000 ? `${Math.round(bytes / 1_000)} KB` : `${(bytes / 1_000_000).toFixed(1)} MB`
}
