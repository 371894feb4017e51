import { expect, test } from 'vitest'
import { filesOfShell, isRuntime, shellFor } from '@/app/_worker/kept-shells'

test.each([
  ['/bay', '/bay'],
  ['/bay/', '/bay'],
  ['/bay/cars/232', '/bay'],
  ['/pit-exit', '/pit-exit'],
  ['/pit-exit/holds', '/pit-exit'],
  ['/sign-on', '/sign-on'],
  ['/sign-on/person/p1', '/sign-on'],
  ['/sign-in', null],
  ['/bayonet', null],
  ['/events/e1/board', null],
  ['/', null],
  ['/api/bay', null],
] as const)('a visit to %s is answered from the shell %s', (path, shell) => {
  expect(shellFor(path)).toBe(shell)
})

test('the files of a shell are found in its markup and its data, once each', () => {
  const html = `<link rel="stylesheet" href="/_next/static/css/3241.css"/><script src="/_next/static/chunks/webpack-94fade.js" async></script>
    <script noModule src="/_next/static/chunks/polyfills-4237.js"></script>
    <script>self.x.push([1,"1:I[5,[\\"7\\",\\"/_next/static/chunks/app/bay/%5B%5B...path%5D%5D/page-06cf.js\\",\\"/_next/static/chunks/webpack-94fade.js\\"]]"])</script>
    <a href="/bay/_next.js">no file of the build</a>`

  expect(filesOfShell(html)).toEqual([
    '/_next/static/css/3241.css',
    '/_next/static/chunks/webpack-94fade.js',
    '/_next/static/chunks/app/bay/%5B%5B...path%5D%5D/page-06cf.js',
  ])
})

test('the runtime of the build is told from its other files', () => {
  expect(isRuntime('/_next/static/chunks/webpack-94fade8ccdcbd049.js')).toBe(true)
  expect(isRuntime('/_next/static/chunks/main-app-94fade8ccdcbd049.js')).toBe(false)
})
