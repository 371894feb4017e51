import type { Html5Qrcode } from 'html5-qrcode'
import { assert } from '@/lib/platform/assert'
import type { ScanProblemCode, StartScanner } from './port'
import { type ReaderElement, readerElement } from './reader-element'
import { scanProblem } from './scan-problem'
import { seenLately } from './seen-lately'

const QUIET_MS = 2000
/** A pause after each scan, not a rate: 30 leaves the least of it. */
const FPS = 30
const PLAYS_WITHIN_MS = 8000

/** The camera as a reader of codes. The library is loaded on the first call and nowhere else. */
export const startScanner: StartScanner = (host, onText, onProblem, onReady) => {
  // React starts effects twice while developing: whoever stops early must win over a start that is still under way.
  let isOver = false
  const reader = readerElement(host)
  const isNew = seenLately(QUIET_MS)
  const take = (text: string) => {
    if (!isOver && isNew(text, performance.now())) onText(text)
  }
  const running = open(reader, take).then(
    (scanner) => {
      if (!isOver) onReady?.({ setTorch: torchOf(scanner) })
      return scanner
    },
    async (error: unknown) => {
      if (!isOver) onProblem(scanProblem(error instanceof DecoderMissing ? 'decoder' : await whyNoCamera()))
      return null
    },
  )
  return async () => {
    isOver = true
    const scanner = await running
    if (scanner !== null) await close(scanner, reader)
    reader.remove()
  }
}

class DecoderMissing extends Error {}

async function open(reader: ReaderElement, take: (text: string) => void): Promise<Html5Qrcode> {
  const [library] = await Promise.all([import('html5-qrcode'), loadDecoder()]).catch((cause: unknown) => {
    throw cause instanceof DecoderMissing ? cause : new DecoderMissing('the scanner could not be loaded', { cause })
  })
  const { Html5Qrcode: Scanner, Html5QrcodeSupportedFormats } = library
  reader.setWidth(window.innerHeight > window.innerWidth ? 720 : 1280)
  const scanner = new Scanner(reader.id, {
    verbose: false,
    formatsToSupport: [Html5QrcodeSupportedFormats.QR_CODE],
    useBarCodeDetectorIfSupported: true,
  })
  dropSlowDecoder(scanner)
  await start(scanner, reader, take)
  const width = reader.element.querySelector('video')?.videoWidth ?? 0
  if (width > 0 && Math.abs(width - reader.element.offsetWidth) > 16) {
    // The camera gave another picture than asked for: once more, as wide as that.
    await close(scanner, reader)
    reader.setWidth(width)
    await start(scanner, reader, take)
  }
  return scanner
}

async function start(scanner: Html5Qrcode, reader: ReaderElement, take: (text: string) => void): Promise<void> {
  const videoConstraints = { facingMode: { ideal: 'environment' }, width: { ideal: 1280 }, height: { ideal: 720 } }
  const qrbox = (width: number, height: number) => {
    const side = Math.max(50, Math.round((Math.min(width, height) * 2) / 3))
    return { width: side, height: side }
  }
  await scanner.start({ facingMode: 'environment' }, { fps: FPS, disableFlip: true, qrbox, videoConstraints }, take, undefined)
  // It says it has started before the picture plays; stopped in between it would throw and leave the camera on.
  for (let waited = 0; !scanner.isScanning && waited < PLAYS_WITHIN_MS; waited += 20) await new Promise((next) => setTimeout(next, 20))
  if (scanner.isScanning) return
  await close(scanner, reader)
  throw new Error('The camera was opened, but gave no picture.')
}

/** Frees the camera, whatever state it is in. */
async function close(scanner: Html5Qrcode, { element }: ReaderElement): Promise<void> {
  const stream = element.querySelector('video')?.srcObject
  try {
    if (scanner.isScanning) await scanner.stop()
  } finally {
    if (stream instanceof MediaStream) for (const track of stream.getTracks()) track.stop()
  }
}

async function loadDecoder(): Promise<void> {
  const { installWasmDetector } = await import('./wasm-detector')
  await installWasmDetector()
}

/** It would take every second frame with its own decoder, which is slower and reads less. Private, so the version is pinned and this is checked. */
function dropSlowDecoder(scanner: Html5Qrcode): void {
  const shim: unknown = Reflect.get(scanner, 'qrcode')
  assert(
    typeof shim === 'object' && shim !== null && 'secondaryDecoder' in shim,
    'html5-qrcode no longer keeps its second decoder in qrcode.secondaryDecoder',
  )
  shim.secondaryDecoder = undefined
}

/** The library says why in prose only; the browser knows it as facts. */
async function whyNoCamera(): Promise<ScanProblemCode> {
  if (!window.isSecureContext || navigator.mediaDevices === undefined) return 'insecure'
  const permission = await navigator.permissions.query({ name: 'camera' }).catch(() => null)
  if (permission?.state === 'denied') return 'refused'
  const devices = await navigator.mediaDevices.enumerateDevices().catch(() => [])
  return devices.some(({ kind }) => kind === 'videoinput') ? 'busy' : 'no-camera'
}

function torchOf(scanner: Html5Qrcode): ((isOn: boolean) => Promise<void>) | null {
  const torch = scanner.getRunningTrackCameraCapabilities().torchFeature()
  return torch.isSupported() ? (isOn) => torch.apply(isOn) : null
}
