import { cleanup, screen, within } from '@testing-library/react'
import { beforeEach, expect, test } from 'vitest'
import { aPicture, fakePictures } from '../support/fake-pictures'
import { aBegunBay, aHarnessBay, pick, saved, type Bay } from './a-bay'

beforeEach(fakePictures)

const camera = () => screen.findByLabelText('Photograph')

async function atTheNuts(bay: Bay): Promise<void> {
  bay.open(`/bay/car/${bay.car}/front`)
  await pick(bay, /wheels\.nuts/)
}

async function shows(bay: Bay, words: string): Promise<void> {
  await bay.user.upload(await camera(), aPicture(words))
  await screen.findByRole('button', { name: /^Photograph: / })
}

const textOf = async (bay: Bay, hash: string) => (await bay.phone.day.photos.read(hash))?.text()

test('[M1 S9] a photograph taken at a check goes with the answer, made small, and stands beside the finding at once, offline', async () => {
  const bay = await aBegunBay()
  bay.phone.network.weather = () => 'drop'
  await atTheNuts(bay)
  await shows(bay, 'a slack nut')
  await bay.press('Not so')
  await bay.user.type(screen.getByRole('textbox', { name: /In your own words/ }), 'slack')
  await bay.press('anything else')

  const { outcome, photos = [] } = await saved(bay, 'wheels.nuts.front')
  expect([outcome, photos.length]).toEqual(['fail', 1])
  expect(await textOf(bay, photos[0] ?? '')).toBe('picture of a slack nut at 1600 × 1200')
  cleanup()
  await atTheNuts(bay)
  expect(await screen.findByRole('button', { name: 'Photograph: wheels.nuts, fail' })).toBeVisible()
})

test('the phone’s camera is asked for, and only pictures', async () => {
  const bay = await aBegunBay()
  await atTheNuts(bay)

  expect(await camera()).toHaveAttribute('capture', 'environment')
  expect(await camera()).toHaveAttribute('accept', 'image/*')
})

test('a reload between photograph and answer loses neither: the check opens again with it', async () => {
  const bay = await aBegunBay()
  await atTheNuts(bay)
  await shows(bay, 'a slack nut')
  cleanup()
  bay.open(`/bay/car/${bay.car}/front`)

  expect(await screen.findByRole('button', { name: 'Photograph: wheels.nuts' })).toBeVisible()
})

test('one taken by mistake is taken away again, from the device too', async () => {
  const bay = await aBegunBay()
  await atTheNuts(bay)
  await shows(bay, 'the wrong wheel')
  await bay.press('Photograph: wheels.nuts')
  await bay.press('Take it away')
  await bay.press('Seen so')

  expect((await saved(bay, 'wheels.nuts.front')).photos).toBeUndefined()
  expect(bay.phone.disk.beside.get('photos')?.values.size).toBe(0)
})

test('what is no picture is told in words, and the answer can still be given', async () => {
  const bay = await aBegunBay()
  await atTheNuts(bay)
  await bay.user.upload(await camera(), new File(['text'], 'IMG_0002.jpg', { type: 'image/jpeg' }))

  expect(await screen.findByText('What was chosen is no photograph that this device can read.')).toBeVisible()
  await bay.press('Seen so')
  expect((await saved(bay, 'wheels.nuts.front')).outcome).toBe('ok')
})

test('a device without room says that the photograph was not kept, and keeps what is entered', async () => {
  const bay = await aBegunBay()
  await atTheNuts(bay)
  bay.phone.disk.beside.get('photos')?.faults.push('full')
  await bay.user.upload(await camera(), aPicture('a slack nut'))

  expect(await screen.findByText('This device has no room left for the photograph.')).toBeVisible()
  expect(screen.queryByRole('button', { name: /^Photograph: / })).toBeNull()
})

test('where the checklist asks a photograph, a fail is recorded once it is taken', async () => {
  const bay = await aHarnessBay()
  bay.open(`/bay/car/${bay.car}/cabin`)
  await pick(bay, /webbing$/)
  await bay.press('Not so')
  await bay.press(/Cut/)
  const sheet = await screen.findByRole('dialog', { name: /^Show it: / })
  expect(bay.findings('harness.webbing')).toEqual([])
  await bay.user.upload(within(sheet).getByLabelText('Take a photograph'), aPicture('cut webbing'))

  const { photos = [] } = await saved(bay, 'harness.webbing')
  expect(await textOf(bay, photos[0] ?? '')).toContain('cut webbing')
})

test('a camera that fails never keeps a fail from being recorded: it says that there is no photograph', async () => {
  const bay = await aHarnessBay()
  bay.open(`/bay/car/${bay.car}/cabin`)
  await pick(bay, /webbing$/)
  await bay.press('Not so')
  await bay.press(/Cut/)
  await bay.press('No photograph can be taken')

  const { outcome, notes = [], photos } = await saved(bay, 'harness.webbing')
  expect([outcome, photos]).toEqual(['fail', undefined])
  expect(bay.phone.day.note(notes[0] ?? '')).toBe('No photograph could be taken.')
})

test('back from being asked for a photograph, nothing was recorded', async () => {
  const bay = await aHarnessBay()
  bay.open(`/bay/car/${bay.car}/cabin`)
  await pick(bay, /webbing$/)
  await bay.press('Not so')
  await bay.press(/Cut/)
  await bay.press('Back to the check')

  expect(bay.findings('harness.webbing')).toEqual([])
  expect(screen.getByRole('button', { name: 'Not so' })).toBeEnabled()
})
