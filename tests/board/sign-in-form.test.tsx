import { cleanup, fireEvent, render, screen } from '@testing-library/react'
import { afterEach, describe, expect, test, vi } from 'vitest'
import { SignInForm } from '@/app/(public)/sign-in/_sign-in/sign-in-form'
import { answering } from './answers'

afterEach(() => {
  cleanup()
  vi.unstubAllGlobals()
})

function signIn(email: string, password: string) {
  render(<SignInForm next={null} />)
  fireEvent.change(screen.getByLabelText('E-mail'), { target: { value: email } })
  fireEvent.change(screen.getByLabelText('Password'), { target: { value: password } })
  fireEvent.click(screen.getByRole('button', { name: 'Sign in' }))
}

describe('signing in', () => {
  test('what is missing or no address is said at its field, and nothing is sent', async () => {
    const asked = answering('no network')
    signIn('dorian', '')

    expect(await screen.findByText('Write an e-mail address, such as name@example.org.')).toBeVisible()
    expect(screen.getByText('Write your password.')).toBeVisible()
    expect(screen.getByLabelText('E-mail')).toHaveAttribute('aria-invalid', 'true')
    expect(asked).toEqual([])
  })

  test('a refusal is told in the server’s words, and what was typed stays', async () => {
    const refused = {
      status: 401,
      code: 'sign-in-refused',
      what: 'E-mail and password do not belong together.',
      todo: 'Check both.',
    } as const
    const asked = answering({ problem: refused })
    signIn(' Dorian@Marram.example ', 'wrong password')

    expect(await screen.findByText('E-mail and password do not belong together.')).toBeVisible()
    expect(asked[0]).toMatchObject({ url: '/api/sign-in', body: { email: 'dorian@marram.example', password: 'wrong password' } })
    expect(screen.getByLabelText('Password')).toHaveValue('wrong password')
  })

  test('too many tries say how long to wait', async () => {
    answering({ problem: { status: 429, code: 'too-many-tries', what: 'Too many wrong tries.', todo: 'Try again in 14 minutes.' } })
    signIn('dorian@marram.example', 'wrong')

    expect(await screen.findByText('Try again in 14 minutes.')).toBeVisible()
  })
})
