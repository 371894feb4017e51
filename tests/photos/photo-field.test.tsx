import { cleanup, render, screen, waitFor } from '@testing-library/react'
import userEvent from '@testing-library/user-event'
import { useState } from 'react'
import { afterEach, beforeEach, expect, test, vi } from 'vitest'
import { PhotoField } from '@/app/_photos/photo-field'
import { answering } from '../board/answers'
import { aPicture, fakePictures } from '../support/fake-pictures'

beforeEach(fakePictures)
afterEach(() => {
  cleanup()
  vi.unstubAllGlobals()
})

const onHash = vi.fn()
function Form() {
  const [hash, setHash] = useState<string | null>(null)
  const onChange = (next: string | null) => {
    setHash(next)
    onHash(next)
  }
  return <PhotoField label="Label of the left belt" value={hash} onChange={onChange} />
}

test('a photograph is made small, sent at once, shown from the server, and its hash is the value', async () => {
  const asked = answering({ ok: { hash: 'a', width: 1600, height: 1200, bytes: 9 } })
  render(<Form />)
  await userEvent.upload(screen.getByLabelText('Take a photograph'), aPicture('a belt'))

  const thumb = await screen.findByRole('button', { name: 'Photograph: Label of the left belt' })
  const hash = onHash.mock.lastCall?.[0] as string
  expect(hash).toMatch(/^[0-9a-f]{64}$/)
  expect(asked).toMatchObject([{ method: 'PUT', url: `/api/photos/${hash}` }])
  expect(thumb.querySelector('img')).toHaveAttribute('src', `/api/photos/${hash}`)

  await userEvent.click(screen.getByRole('button', { name: 'Take it away' }))
  expect(onHash).toHaveBeenLastCalledWith(null)
})

test('no network: it says so, keeps the picture on the page, and sends it again when asked', async () => {
  onHash.mockClear()
  answering('no network', { ok: { hash: 'a', width: 1600, height: 1200, bytes: 9 } })
  render(<Form />)
  await userEvent.upload(screen.getByLabelText('Take a photograph'), aPicture('a belt'))
  expect(await screen.findByText('The server could not be reached.')).toBeVisible()
  expect(screen.getByText('The photograph is still on this page.')).toBeVisible()
  expect(onHash).not.toHaveBeenCalled()

  await userEvent.click(screen.getByRole('button', { name: 'Send it again' }))
  await waitFor(() => expect(onHash).toHaveBeenCalledOnce())
  expect(screen.queryByText('The server could not be reached.')).toBeNull()
})

test('what is no picture is told before anything is sent', async () => {
  const asked = answering('no network')
  render(<Form />)
  await userEvent.upload(screen.getByLabelText('Take a photograph'), new File(['a page'], 'x.jpg', { type: 'image/jpeg' }))

  expect(await screen.findByText('What was chosen is no photograph that this device can read.')).toBeVisible()
  expect(asked).toEqual([])
})
