import type { BrowserStores } from './enrol-here'
import { indexedDbStore } from './store-indexed-db'

/** The stores of this browser in IndexedDB. */
export const browserStores: BrowserStores = {
  phone: () => indexedDbStore('lockwire-phone'),
  device: (event, device) => indexedDbStore(`lockwire-${event}-${device}`),
}
