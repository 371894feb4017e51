import { expect, test } from 'vitest'
import { aSyncPaddock } from '../support/sync-paddock'
import { finds, one, presents, seesAll } from '../support/sync-walk'

test('a car is walked offline, passed on the device, and everybody agrees once there is signal', async () => {
  const paddock = await aSyncPaddock()
  const bay = await paddock.phone(['scrutineer'])
  const exit = await paddock.phone(['marshal'])
  const [car] = paddock.cars as [string]
  await bay.day.loadDay()
  await exit.day.loadDay()
  bay.network.weather = () => 'drop'

  await presents(bay.day, car)
  expect(bay.day.state(`car:${car}`).verdict).toBe('in progress')
  await seesAll(bay.day, car)
  expect(bay.day.state(`car:${car}`).verdict).toBe('passed')
  const issued = await bay.day.issuePass({ entry: car, passengerSeatUsable: true })
  expect(issued.payload).toMatchObject({ type: 'pass', entry: 1, number: '47', counter: 1, days: 1, validFrom: '2026-05-09' })
  expect(issued.qrText).toBe(`HTTPS://MARRAM.EXAMPLE/P/${issued.token}`)
  expect(bay.day.passList()?.entries[0]?.passes).toMatchObject([{ state: 'live', typedCode: issued.typedCode }])
  expect(bay.day.status()).toMatchObject({ unsent: 7, problem: null })

  expect((await bay.day.drain()).state).toBe('failed')
  expect(bay.day.status()).toMatchObject({ unsent: 7, link: 'offline', problem: null })
  bay.network.weather = () => 'pass'
  expect(await bay.day.drain()).toMatchObject({ state: 'done', sent: 7 })
  expect(bay.day.status().unsent).toBe(0)

  await exit.day.drain()
  expect(exit.day.passList()).toMatchObject({ seq: 7, entries: [{ verdict: 'passed', passes: [{ state: 'live' }] }, {}] })
  expect(exit.day.state(`car:${car}`)).toEqual(bay.day.state(`car:${car}`))
})

test('a hold made at the pit exit kills the pass there at once, and in the bay after a pull', async () => {
  const paddock = await aSyncPaddock()
  const bay = await paddock.phone(['scrutineer'])
  const exit = await paddock.phone(['marshal'])
  const [car] = paddock.cars as [string]
  await bay.day.loadDay()
  await presents(bay.day, car)
  await seesAll(bay.day, car)
  await bay.day.issuePass({ entry: car, passengerSeatUsable: false })
  await bay.day.drain()
  await exit.day.loadDay()
  expect(exit.day.passList()?.entries[0]?.passes[0]?.state).toBe('live')

  exit.network.weather = () => 'drop'
  await one(exit.day, { kind: 'hold', subject: { car }, reason: 'contact', stations: ['body'], checks: [], stickerRemoved: true })
  expect(exit.day.passList()?.entries[0]).toMatchObject({
    verdict: 'held',
    blocks: [{ kind: 'hold', words: 'light contact' }],
    passes: [{ state: 'dead' }],
  })
  exit.network.weather = () => 'pass'
  await exit.day.drain()
  await bay.day.drain()
  expect(bay.day.state(`car:${car}`)).toMatchObject({ verdict: 'held', passes: [{ state: 'dead' }] })

  for (const check of bay.day.state(`car:${car}`).blocks.flatMap(({ checksLeft }) => checksLeft)) await finds(bay.day, car, check, 'ok')
  await bay.day.drain()
  expect(bay.day.state(`car:${car}`).verdict).toBe('passed')
  paddock.time.now += 60_000
  await expect(bay.day.issuePass({ entry: car, passengerSeatUsable: false })).resolves.toMatchObject({ payload: { counter: 2 } })
  await bay.day.drain()
  await exit.day.drain()
  expect(exit.day.passList()?.entries[0]?.passes.map(({ state }) => state)).toEqual(['dead', 'live'])
})
