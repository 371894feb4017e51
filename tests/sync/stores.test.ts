import 'fake-indexeddb/auto'
import { lockQueue } from '@/lib/sync/client/lock-queue'
import { indexedDbStore } from '@/lib/sync/client/store-indexed-db'
import { memoryDeviceStore, memoryDisk } from '@/lib/sync/client/store-memory'
import { storeContract } from './store-contract'

let databases = 0

storeContract('memory', () => {
  const disk = memoryDisk()
  return { open: async () => memoryDeviceStore(disk) }
})

storeContract('IndexedDB', () => {
  databases += 1
  const name = `exam-${databases}`
  // Node has no Web Locks; the page's own queue stands in for the browser's, shared as the browser's is.
  const locks = lockQueue()
  return { open: async () => ({ ...(await indexedDbStore(name)), ...locks }) }
})
