import { render, screen } from '@testing-library/react'
import userEvent from '@testing-library/user-event'
import { useForm } from 'react-hook-form'
import { expect, test } from 'vitest'
import { TextField } from '@/app/_ui/field'

test('label, description and error belong to the control for everybody who hears it', () => {
  render(<TextField label="Number" description="As on the door." error="Number 232 is taken." defaultValue="232" />)
  const input = screen.getByLabelText('Number')

  expect(input).toHaveAccessibleDescription('As on the door. Number 232 is taken.')
  expect(input).toBeInvalid()
  expect(input).toHaveValue('232')
})

test('without an error it is not called invalid', () => {
  render(<TextField label="Number" />)

  expect(screen.getByLabelText('Number')).toBeValid()
})

test('a form library registers on it and reads what was typed', async () => {
  const seen: unknown[] = []
  function Form() {
    const { register, handleSubmit } = useForm<{ plate: string }>()
    return (
      <form onSubmit={handleSubmit((values) => void seen.push(values))}>
        <TextField label="Plate" {...register('plate')} />
        <button>Save</button>
      </form>
    )
  }
  render(<Form />)

  await userEvent.type(screen.getByLabelText('Plate'), 'K90 VGN')
  await userEvent.click(screen.getByRole('button', { name: 'Save' }))

  expect(seen).toEqual([{ plate: 'K90 VGN' }])
})
