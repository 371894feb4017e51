import { createServer as createPlainServer, request } from 'node:http'
import { createServer } from 'node:https'
import { Refusal } from './say.mjs'

/**
 * https in front of the server for phones on the local network, byte for byte: event streams flow, photographs pass whole.
 * `inner` is the port of the server on this machine. Resolves once it listens.
 */
export function startLanProxy({ port, address, inner, key, cert }) {
  const proxy = createServer({ key, cert }, (asked, answer) => {
    const headers = { ...asked.headers, 'x-forwarded-for': asked.socket.remoteAddress ?? '', 'x-forwarded-proto': 'https' }
    const passed = request({ host: '127.0.0.1', port: inner, method: asked.method, path: asked.url, headers }, (given) => {
      answer.writeHead(given.statusCode ?? 502, given.headers)
      given.pipe(answer)
    })
    passed.on('error', () => {
      if (!answer.headersSent) answer.writeHead(502, { 'content-type': 'text/plain' })
      answer.end('The server behind this address does not answer.')
    })
    // Whoever goes away is no longer served: a stream would live on for nobody.
    answer.on('close', () => passed.destroy())
    asked.pipe(passed)
  })
  return listening(proxy, port, address)
}

/** A plain page that gives the authority's certificate to a phone, which cannot have it over the https it does not trust yet. */
export function startCertificatePage({ port, address, origin, authority }) {
  const page = `<!doctype html><html lang="en"><meta name="viewport" content="width=device-width"><title>Lockwire: trust this demo</title>
<body style="font:18px/1.5 sans-serif;max-width:34em;margin:2em auto;padding:0 1em">
<h1>Trust this demo on your phone</h1>
<p>Camera and offline work need https. This phone trusts it once the demo's own certificate is installed. It is good for private addresses only; take it off again afterwards.</p>
<p><a href="/lockwire-authority.crt">1. Download the certificate</a></p>
<p>2. Android: Settings, Security, Encryption and credentials, Install a certificate, CA certificate.<br>iPhone: Settings, Profile downloaded, Install; then General, About, Certificate trust settings, switch it on.</p>
<p><a href="${origin}">3. Open ${origin}</a></p>`
  const server = createPlainServer((asked, answer) => {
    if (asked.url === '/lockwire-authority.crt') {
      answer.writeHead(200, {
        'content-type': 'application/x-x509-ca-cert',
        'content-disposition': 'attachment; filename="lockwire-authority.crt"',
      })
      return answer.end(authority)
    }
    answer.writeHead(200, { 'content-type': 'text/html; charset=utf-8' })
    return answer.end(page)
  })
  return listening(server, port, address)
}

function listening(server, port, address) {
  return new Promise((done, failed) => {
    server.once('error', (error) =>
      failed(new Refusal(`Port ${port} on ${address} cannot be had (${error.code}). Use another: PORT=${port + 10} npm run demo -- --lan`)),
    )
    server.listen(port, address, () => done(server))
  })
}
