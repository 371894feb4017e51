import { expect, test } from 'vitest'
import * as registry from '@/lib/contracts/registry'
import { projectFiles, sources, textOf } from '../support/project-files'

interface Registered {
  readonly name: string
  readonly method: string
  readonly path: string
  readonly limitBytes: number
}

const contracts = Object.values(registry).flatMap(registeredIn)
const routes = projectFiles().filter((file) => /^app\/api\/(?:.*\/)?route\.ts$/.test(file))
const exported = routes.flatMap((file) => methodsOf(textOf(file)).map((method) => `${method} ${pathOf(file)}`))

test('there are routes and contracts to compare', () => {
  expect(routes.length).toBeGreaterThan(0)
  expect(contracts.length).toBeGreaterThan(0)
})

test('every route under app/api has a contract in the registry', () => {
  const known = new Set(contracts.map(({ method, path }) => `${method} ${path}`))

  expect(exported.filter((each) => !known.has(each))).toEqual([])
})

test('every contract in the registry has its route', () => {
  const there = new Set(exported)

  expect(contracts.map(({ method, path }) => `${method} ${path}`).filter((each) => !there.has(each))).toEqual([])
})

test('no two contracts share a name or a method and path', () => {
  expect(new Set(contracts.map(({ name }) => name)).size).toBe(contracts.length)
  expect(new Set(contracts.map(({ method, path }) => `${method} ${path}`)).size).toBe(contracts.length)
})

test('every route goes through the one door: each method it exports is made by a function of lib/http', () => {
  const around = routes.filter((file) => {
    const text = textOf(file)
    return (
      methodsOf(text).length === 0 ||
      !/from '@\/lib\/http\//.test(text) ||
      /export (?:async )?function (?:GET|POST|PUT|PATCH|DELETE)/.test(text)
    )
  })

  expect(around).toEqual([])
})

test('route handlers stand under app/api only, so that the registry sees all of them', () => {
  const elsewhere = sources('app').filter((file) => /\/route\.tsx?$/.test(file) && !file.startsWith('app/api/'))

  expect(elsewhere).toEqual([])
})

function methodsOf(text: string): readonly string[] {
  return [...text.matchAll(/export (?:const|(?:async )?function) (GET|POST|PUT|PATCH|DELETE|HEAD|OPTIONS)\b/g)].map(
    (match) => match[1] ?? '',
  )
}

function pathOf(file: string): string {
  return file.replace(/^app/, '').replace(/\/route\.ts$/, '').replace(/\/\([^)]*\)/g, '') // prettier-ignore
}

/** A contract, a list of contracts or an object of contracts. */
function registeredIn(value: unknown): readonly Registered[] {
  if (typeof value !== 'object' || value === null) return []
  if (isRegistered(value)) return [value]
  return Object.values(value).filter(
    (each): each is Registered => typeof each === 'object' && each !== null && isRegistered(each as object),
  )
}

function isRegistered(value: object): value is Registered {
  return 'name' in value && 'method' in value && 'path' in value && 'limitBytes' in value
}
