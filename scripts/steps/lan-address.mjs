import { networkInterfaces } from 'node:os'
import { Refusal } from './say.mjs'

/**
 * This machine's address on the local network: `LAN_ADDRESS` where it is set, else the only private IPv4 address there is.
 * @returns {string}
 */
export function lanAddress(asked = process.env.LAN_ADDRESS, interfaces = networkInterfaces()) {
  const found = Object.values(interfaces)
    .flat()
    .filter((each) => each.family === 'IPv4' && !each.internal && isPrivate(each.address))
    .map(({ address }) => address)
  if (asked) {
    if (isPrivate(asked)) return asked
    throw new Refusal(`LAN_ADDRESS must be a private IPv4 address such as 192.168.1.20; it is “${asked}”. Nothing was started.`)
  }
  const [only, ...more] = new Set(found)
  if (only === undefined)
    throw new Refusal(
      'This machine has no address on a local network. Nothing was started. Join the network, or name one: LAN_ADDRESS=192.168.1.20',
    )
  if (more.length > 0)
    throw new Refusal(
      `This machine has several addresses: ${[only, ...more].join(', ')}. Nothing was started. Say which the phones reach: LAN_ADDRESS=${only} npm run demo -- --lan`,
    )
  return only
}

/** RFC 1918, the three ranges that are nobody's on the internet. */
export function isPrivate(address) {
  const parts = address.split('.').map(Number)
  if (parts.length !== 4 || parts.some((part) => !Number.isInteger(part) || part < 0 || part > 255)) return false
  const [a, b] = parts
  return a === 10 || (a === 172 && b >= 16 && b <= 31) || (a === 192 && b === 168)
}
