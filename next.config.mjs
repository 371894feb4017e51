import { PHASE_PRODUCTION_BUILD } from 'next/constants.js'

/** What is the same on every answer; what changes per request or per deployment (nonce, HSTS) is in proxy.ts. */
const everywhere = [
  { key: 'X-Content-Type-Options', value: 'nosniff' },
  { key: 'Referrer-Policy', value: 'same-origin' },
  { key: 'Permissions-Policy', value: 'camera=(self), microphone=(), geolocation=(), payment=(), usb=(), browsing-topics=()' },
  { key: 'Cross-Origin-Opener-Policy', value: 'same-origin' },
  { key: 'Cross-Origin-Resource-Policy', value: 'same-origin' },
  { key: 'X-Frame-Options', value: 'DENY' },
]

/** @type {import('next').NextConfig} */
const config = {
  poweredByHeader: false,
  // Native modules stay what they are: a bundler cannot hold them.
  serverExternalPackages: ['better-sqlite3', '@node-rs/argon2', 'nodemailer', 'sharp'],
  // The optimiser would fetch and decode what it is told to; proxy.ts refuses its address as well.
  images: { unoptimized: true },
  // Types are checked by their own lane over the whole project (`npm run typecheck`); here they would only be checked a second time.
  typescript: { ignoreBuildErrors: true },
  async headers() {
    return [
      { source: '/:path*', headers: everywhere },
      // An answer of the interface is never a page: whatever it holds, it runs nothing and stands in no frame.
      { source: '/api/:path*', headers: [{ key: 'Content-Security-Policy', value: "default-src 'none'; frame-ancestors 'none'" }] },
      // The browser asks the server for the worker each time, so that a new version is seen.
      { source: '/sw.js', headers: [{ key: 'Cache-Control', value: 'no-cache' }] },
    ]
  },
}

export default async function nextConfig(phase) {
  if (phase !== PHASE_PRODUCTION_BUILD) return config
  // Imported here and nowhere else: it takes a second to load, which every start would pay.
  const [{ withWorker }, { copyWasm }] = await Promise.all([import('./app/_worker/with-worker.mjs'), import('./scripts/steps/build.mjs')])
  copyWasm()
  return withWorker(config)
}
