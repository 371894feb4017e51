import { BarcodeDetector, prepareZXingModule } from 'barcode-detector/ponyfill'

let ready: Promise<unknown> | null = null

/**
 * Puts the WebAssembly decoder where html5-qrcode looks for one (`window.BarcodeDetector`), also where the browser brings its own: it reads
 * small and dirty codes on every device alike. Loads the wasm at once, so that a missing one is known now and not by silence.
 * The file is ours: by default the package would fetch it from elsewhere, which the policy forbids and no network would answer.
 */
export async function installWasmDetector(): Promise<void> {
  ready ??= Promise.resolve(
    prepareZXingModule({
      overrides: { locateFile: (file: string, prefix: string) => (file.endsWith('.wasm') ? '/wasm/zxing_reader.wasm' : prefix + file) },
      fireImmediately: true,
    }),
  )
  try {
    await ready
  } catch (error) {
    ready = null // the next start tries again
    throw error
  }
  Object.assign(window, { BarcodeDetector })
}
