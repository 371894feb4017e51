import { mkdtempSync, rmSync } from 'node:fs'
import { createServer, type Server } from 'node:http'
import { get, request } from 'node:https'
import type { AddressInfo } from 'node:net'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { afterAll, beforeAll, expect, test } from 'vitest'
import { lanAddress } from '../../scripts/steps/lan-address.mjs'
import { startCertificatePage, startLanProxy } from '../../scripts/steps/lan-proxy.mjs'
import { localCertificate } from '../../scripts/steps/local-authority.mjs'

const ip = (address: string, internal = false) => ({
  family: 'IPv4' as const,
  internal,
  address,
  netmask: '255.255.255.0',
  mac: '',
  cidr: null,
})

test('the only private address of the machine is the one phones reach', () => {
  expect(lanAddress(undefined, { lo: [ip('127.0.0.1', true)], eth0: [ip('192.168.7.20')], public: [ip('203.0.113.9')] })).toBe(
    '192.168.7.20',
  )
})

test.each([
  ['none', { lo: [ip('127.0.0.1', true)] }, /no address on a local network.*LAN_ADDRESS/],
  ['several', { eth0: [ip('192.168.7.20')], wlan0: [ip('10.0.0.4')] }, /192\.168\.7\.20, 10\.0\.0\.4.*LAN_ADDRESS/],
])('with %s it says what to do instead of guessing', (_, interfaces, words) => {
  expect(() => lanAddress(undefined, interfaces)).toThrow(words)
})

test.each(['203.0.113.9', '172.32.0.1', 'localhost', '10.0.0', '10.0.0.256'])('%s is no private address', (asked) => {
  expect(() => lanAddress(asked, {})).toThrow(/private IPv4/)
})

let folder: string
let inner: Server
let outer: Server
let page: Server
let port: number
let trust: { readonly ca: string; readonly servername: string }
let ended = false

beforeAll(async () => {
  folder = mkdtempSync(join(tmpdir(), 'lockwire-lan-'))
  const { key, cert, authority } = localCertificate(folder, '10.1.2.3')
  inner = createServer((asked, answer) => {
    if (asked.url === '/stream') {
      answer.writeHead(200, { 'content-type': 'text/event-stream' })
      answer.write('data: first\n\n')
      answer.on('close', () => (ended = true))
      return
    }
    let bytes = 0
    asked.on('data', (chunk: Buffer) => (bytes += chunk.length))
    asked.on('end', () => answer.end(JSON.stringify({ bytes, host: asked.headers.host })))
  })
  await new Promise<void>((done) => inner.listen(0, '127.0.0.1', done))
  outer = await startLanProxy({ port: 0, address: '127.0.0.1', inner: (inner.address() as AddressInfo).port, key, cert })
  port = (outer.address() as AddressInfo).port
  page = await startCertificatePage({ port: 0, address: '127.0.0.1', origin: 'https://10.1.2.3:3000', authority })
  trust = { ca: authority, servername: 'localhost' }
})

afterAll(() => {
  for (const server of [inner, outer, page]) server.close()
  rmSync(folder, { recursive: true, force: true })
})

test('whoever trusts the authority trusts the address, and twelve megabytes pass whole', async () => {
  const said = await new Promise<string>((done, failed) => {
    const asked = request({ ...trust, host: '127.0.0.1', port, method: 'POST', path: '/' }, (answer) => {
      let text = ''
      answer.on('data', (chunk: Buffer) => (text += chunk.toString()))
      answer.on('end', () => done(text))
    })
    asked.on('error', failed)
    asked.end(Buffer.alloc(12_000_000))
  })
  expect(JSON.parse(said)).toEqual({ bytes: 12_000_000, host: `127.0.0.1:${port}` })
})

test('an event arrives while its stream is open, and a phone that goes away ends it', async () => {
  const first = await new Promise<string>((done, failed) => {
    const asked = get({ ...trust, host: '127.0.0.1', port, path: '/stream' }, (answer) => {
      answer.once('data', (chunk: Buffer) => {
        done(chunk.toString())
        asked.destroy()
      })
      answer.on('error', () => undefined)
    })
    asked.on('error', failed)
  })
  expect(first).toBe('data: first\n\n')
  await expect.poll(() => ended).toBe(true)
})

test('without the authority nobody trusts it', async () => {
  const fault = await new Promise<NodeJS.ErrnoException>((done) => {
    get({ host: '127.0.0.1', port, servername: 'localhost', path: '/' }).on('error', done)
  })
  expect(fault.code).toMatch(/SELF_SIGNED|UNABLE_TO/)
})

test('the plain page gives the certificate and says where to go', async () => {
  const origin = `http://127.0.0.1:${(page.address() as AddressInfo).port}`
  expect(await (await fetch(`${origin}/lockwire-authority.crt`)).text()).toContain('BEGIN CERTIFICATE')
  expect(await (await fetch(origin)).text()).toContain('https://10.1.2.3:3000')
})

test('the certificate is made once and kept; another address gets another', () => {
  const again = localCertificate(folder, '10.1.2.3')
  const other = localCertificate(folder, '10.1.2.4')
  expect(again.authority).toBe(trust.ca)
  expect(other.authority).toBe(trust.ca)
  expect(other.cert).not.toBe(again.cert)
})
