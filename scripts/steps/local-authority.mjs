import { spawnSync } from 'node:child_process'
import { existsSync, mkdirSync, readFileSync, writeFileSync } from 'node:fs'
import { X509Certificate } from 'node:crypto'
import { Refusal } from './say.mjs'

/**
 * A certificate authority of this machine alone, made once and kept in `folder`, and a certificate of it for `address`. Phones that install
 * `authority.crt` trust https to private addresses and to nothing else: the authority itself is limited to them (RFC 5280, name constraints), so
 * that its key, were it stolen, could pass for no site of the internet. Gives `{ key, cert, authority }`, PEM.
 */
export function localCertificate(folder, address) {
  mkdirSync(folder, { recursive: true, mode: 0o700 })
  const file = (name) => `${folder}/${name}`
  if (!isGood(file('authority.crt'), 30)) makeAuthority(file)
  if (!isGood(file('server.crt'), 2) || !readFileSync(file('server.for'), 'utf8').startsWith(address)) makeCertificate(file, address)
  const read = (name) => readFileSync(file(name), 'utf8')
  return { key: read('server.key'), cert: read('server.crt') + read('authority.crt'), authority: read('authority.crt') }
}

function isGood(path, daysLeft) {
  if (!existsSync(path)) return false
  return Date.parse(new X509Certificate(readFileSync(path)).validTo) > Date.now() + daysLeft * 86_400_000
}

function makeAuthority(file) {
  const extensions = [
    'basicConstraints=critical,CA:TRUE,pathlen:0',
    'keyUsage=critical,keyCertSign,cRLSign',
    'nameConstraints=critical,permitted;IP:10.0.0.0/255.0.0.0,permitted;IP:172.16.0.0/255.240.0.0,permitted;IP:192.168.0.0/255.255.0.0,permitted;DNS:localhost',
  ]
  const wants = extensions.flatMap((extension) => ['-addext', extension])
  const subject = `/CN=Lockwire demo authority ${new Date().toISOString().slice(0, 10)}`
  openssl('req', '-x509', ...newKey(file('authority.key')), '-out', file('authority.crt'), '-days', '365', '-subj', subject, ...wants)
}

/** 90 days: phones refuse certificates that live longer than a little over two years, and this one is made anew by itself. */
function makeCertificate(file, address) {
  openssl('req', '-new', ...newKey(file('server.key')), '-out', file('server.csr'), '-subj', `/CN=${address}`)
  const extensions = `basicConstraints=CA:FALSE\nkeyUsage=critical,digitalSignature\nextendedKeyUsage=serverAuth\nsubjectAltName=IP:${address},DNS:localhost\n`
  writeFileSync(file('server.ext'), extensions)
  const authority = ['-CA', file('authority.crt'), '-CAkey', file('authority.key'), '-CAcreateserial']
  openssl(
    'x509',
    '-req',
    '-in',
    file('server.csr'),
    ...authority,
    '-out',
    file('server.crt'),
    '-days',
    '90',
    '-extfile',
    file('server.ext'),
  )
  writeFileSync(file('server.for'), `${address}\n`)
}

function newKey(path) {
  return ['-newkey', 'ec', '-pkeyopt', 'ec_paramgen_curve:prime256v1', '-nodes', '-keyout', path]
}

function openssl(...args) {
  const { status, error, stderr } = spawnSync('openssl', args, { encoding: 'utf8' })
  if (error?.code === 'ENOENT')
    throw new Refusal(
      'The certificate for the phones is made with openssl, which is not here. Nothing was started. On Debian: apt-get install openssl',
    )
  if (status !== 0) throw new Refusal(`The certificate could not be made. Nothing was started. openssl said:\n${stderr}`)
}
