/** Pages that the worker fetches once, without anybody's sign-in, and answers with offline. Each must be the same for everybody. */
export const SHELLS = ['/bay', '/pit-exit', '/sign-on', '/offline'] as const

export type Shell = (typeof SHELLS)[number]

/** Which kept shell answers a navigation to this path; null when the page needs the network. */
export function shellFor(pathname: string): Shell | null {
  return SHELLS.find((shell) => pathname === shell || pathname.startsWith(`${shell}/`)) ?? null
}

/** The build's own files that a shell's HTML asks for, less those for browsers without modules. */
export function filesOfShell(html: string): readonly string[] {
  const found = html.match(/\/_next\/static\/[\w\-./%()[\]~@]+?\.(?:js|css|woff2)\b/g) ?? []
  return [...new Set(found)].filter((file) => !file.includes('/polyfills-'))
}

/** Webpack's own runtime: its name changes whenever any file of the build does. */
export function isRuntime(file: string): boolean {
  return /\/chunks\/webpack-[0-9a-f]+\.js$/.test(file)
}
