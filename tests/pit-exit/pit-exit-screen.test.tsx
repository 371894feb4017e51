import { screen } from '@testing-library/react'
import { expect, test, vi } from 'vitest'
import { aPassedCar, drawPitExit } from './a-pit-exit'
import { camera } from './fake-scanner'

// From a file of its own: one that imports the screen would wait for this mock, which would wait for it.
vi.mock('@/lib/scanner/html5-qrcode-scanner', async () => ({ startScanner: (await import('./fake-scanner')).fakeScanner }))

test('[P4] a car that is passed reads PASSED, with its shape and its number', async () => {
  const { paddock, marshal, pass } = await aPassedCar()
  drawPitExit(marshal.day, paddock)

  camera.shows(pass.qrText)

  expect(await screen.findByText('PASSED')).toBeInTheDocument()
})
