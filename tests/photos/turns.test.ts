import { expect, test } from 'vitest'
import { turns } from '@/lib/photos/turns'

function held() {
  let end = () => {}
  const done = new Promise<void>((go) => (end = go))
  return { end, work: () => done }
}

test('no more than two run at once, and the third begins when one of them ends', async () => {
  const line = turns(2, 100)
  const [one, two] = [held(), held()]
  const begun: number[] = []
  const runs = [one, two].map(({ work }, index) => line.take(1, () => (begun.push(index), work())))
  const third = line.take(1, async () => begun.push(2))
  await Promise.resolve()
  expect(begun).toEqual([0, 1])

  one.end()
  await third
  expect(begun).toEqual([0, 1, 2])
  two.end()
  await Promise.all(runs)
})

test('what would weigh too much is told at once, and fits when the rest is done', async () => {
  const line = turns(1, 10)
  const one = held()
  const running = line.take(8, one.work)
  expect(await line.take(3, async () => 'done')).toBeNull()
  one.end()
  await running

  expect(await line.take(3, async () => 'done')).toBe('done')
})

test('a work that fails gives its turn and its weight back', async () => {
  const line = turns(1, 10)
  await expect(line.take(10, () => Promise.reject(new Error('broken')))).rejects.toThrow('broken')

  expect(await line.take(10, async () => 'done')).toBe('done')
})

test('one alone always fits, however much it weighs', async () => {
  expect(await turns(1, 10).take(1000, async () => 'done')).toBe('done')
})
