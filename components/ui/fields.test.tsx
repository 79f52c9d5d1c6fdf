import { cleanup, fireEvent, render, screen } from '@testing-library/react'
import { useState } from 'react'
import { afterEach, describe, expect, it, vi } from 'vitest'
import { createMessages } from '@/shared/messages/createMessages'
import { Button } from './Button'
import { CheckBox } from './CheckBox'
import { Choice } from './Choice'
import { FileButton } from './FileButton'
import { KnownByPicker } from './KnownByPicker'
import { MessagesProvider } from './MessagesProvider'
import { NumberField } from './NumberField'
import { Select } from './Select'
import { TextField } from './TextField'

afterEach(cleanup)

describe('TextField', () => {
  it('is found by its label and tells what is wrong with it', () => {
    render(<TextField label="E-mail" value="" onChange={() => {}} error="This address is not complete." />)

    const field = screen.getByLabelText('E-mail')

    expect(field.getAttribute('aria-invalid')).toBe('true')
    const note = document.getElementById(field.getAttribute('aria-describedby') ?? '')
    expect(note?.textContent).toBe('This address is not complete.')
  })

  it('hands on what is typed and says when it is left', () => {
    const [changed, left] = [vi.fn(), vi.fn()]
    render(<TextField label="Notes" value="" onChange={changed} onBlur={left} />)

    fireEvent.change(screen.getByLabelText('Notes'), { target: { value: 'rear wing newer' } })
    fireEvent.blur(screen.getByLabelText('Notes'))

    expect(changed).toHaveBeenCalledWith('rear wing newer')
    expect(left).toHaveBeenCalledOnce()
  })
})

describe('NumberField', () => {
  function Storeys({ onChange }: { readonly onChange: (value: number | null) => void }) {
    const [value, setValue] = useState<number | null>(3)
    return (
      <>
        <NumberField
          label="Storeys"
          value={value}
          onChange={(next) => {
            setValue(next)
            onChange(next)
          }}
        />
        <Button label="take from register" onPress={() => setValue(7)} />
      </>
    )
  }
  const typeIn = (text: string): HTMLInputElement => {
    const field = screen.getByLabelText<HTMLInputElement>('Storeys')
    fireEvent.change(field, { target: { value: text } })
    return field
  }

  it('keeps what was typed while it reads the number', () => {
    const changed = vi.fn()
    render(<Storeys onChange={changed} />)

    expect(typeIn('2,50').value).toBe('2,50')
    expect(changed).toHaveBeenLastCalledWith(2.5)
  })

  it('is empty for no answer', () => {
    const changed = vi.fn()
    render(<Storeys onChange={changed} />)

    typeIn('')

    expect(changed).toHaveBeenLastCalledWith(null)
    expect(screen.queryByText(/not a number/)).toBeNull()
  })

  it('says that something is no number and keeps it to be mended', () => {
    render(<Storeys onChange={() => {}} />)

    const field = typeIn('about 3')

    expect(field.value).toBe('about 3')
    expect(screen.getByText(/This is not a number/)).toBeTruthy()
  })

  it('writes anew what comes from elsewhere, in the separators of the language', () => {
    render(
      <MessagesProvider messages={createMessages('de')}>
        <NumberField label="Height" value={12.5} onChange={() => {}} />
      </MessagesProvider>,
    )
    expect(screen.getByLabelText<HTMLInputElement>('Height').value).toBe('12,5')

    render(<Storeys onChange={() => {}} />)
    fireEvent.click(screen.getByRole('button', { name: 'take from register' }))

    expect(screen.getByLabelText<HTMLInputElement>('Storeys').value).toBe('7')
  })
})

describe('Choice', () => {
  const options = [
    { value: 'exact', label: 'exact' },
    { value: 'between', label: 'between' },
    { value: 'unknown', label: 'not known', disabled: true },
  ] as const

  it('is a group of radios with the chosen one checked', () => {
    render(<Choice label="Construction year" options={options} value="between" onChange={() => {}} />)

    expect(screen.getByRole('radiogroup', { name: 'Construction year' })).toBeTruthy()
    expect(screen.getByRole('radio', { name: 'between' }).getAttribute('aria-checked')).toBe('true')
    expect(screen.getByRole('radio', { name: 'exact' }).tabIndex).toBe(-1)
  })

  it('takes arrow keys, past what cannot be chosen and round the end', () => {
    const changed = vi.fn()
    render(<Choice label="Construction year" options={options} value="between" onChange={changed} />)

    fireEvent.keyDown(screen.getByRole('radio', { name: 'between' }), { key: 'ArrowRight' })

    expect(changed).toHaveBeenCalledWith('exact')
    expect(document.activeElement).toBe(screen.getByRole('radio', { name: 'exact' }))
  })
})

describe('other fields', () => {
  it('turns a check box with a press', () => {
    const changed = vi.fn()
    render(<CheckBox label="Protected building" checked onChange={changed} />)

    fireEvent.click(screen.getByRole('checkbox', { name: 'Protected building', checked: true }))

    expect(changed).toHaveBeenCalledWith(false)
  })

  it('chooses from the browser own list', () => {
    const changed = vi.fn()
    const options = [
      { value: 'office', label: 'office' },
      { value: 'hotel', label: 'hotel' },
    ] as const
    render(<Select label="Use" options={options} value={null} onChange={changed} />)

    fireEvent.change(screen.getByRole('combobox', { name: 'Use' }), { target: { value: 'hotel' } })

    expect(changed).toHaveBeenCalledWith('hotel')
    expect(screen.getByRole('option', { name: 'Choose' })).toBeTruthy()
  })

  it('opens the ways in which an answer is known and closes on the one chosen', () => {
    const changed = vi.fn()
    render(<KnownByPicker of="Storeys" value={null} onChange={changed} />)

    fireEvent.click(screen.getByRole('button', { name: 'Storeys: How is it known? not answered' }))
    fireEvent.click(screen.getByRole('button', { name: 'measured' }))

    expect(changed).toHaveBeenCalledWith('measured')
    expect(screen.queryByRole('button', { name: 'measured' })).toBeNull()
  })

  it('hands on chosen files, the same one twice as well', () => {
    const chosen = vi.fn()
    const { container } = render(<FileButton label="Choose outlines" accept=".geojson" onFiles={chosen} />)
    const input = container.querySelector('input')!
    const file = new File(['{}'], 'outlines.geojson')

    fireEvent.change(input, { target: { files: [file] } })

    expect(chosen).toHaveBeenCalledWith([file])
    expect(input.value).toBe('')
  })
})

describe('Button', () => {
  it('takes no second press while it is busy', () => {
    const pressed = vi.fn()
    render(<Button label="Hand in" busy onPress={pressed} />)

    const button = screen.getByRole('button', { name: 'Hand in' })
    fireEvent.click(button)

    expect(pressed).not.toHaveBeenCalled()
    expect(button.getAttribute('aria-busy')).toBe('true')
  })

  it('is a link that stays in the app', () => {
    const pressed = vi.fn()
    render(<Button label="Open" href="/sheets/7" onPress={pressed} />)

    const link = screen.getByRole('link', { name: 'Open' })
    const wasLeft = fireEvent.click(link)

    expect(link.getAttribute('href')).toBe('/sheets/7')
    expect(wasLeft).toBe(false)
    expect(pressed).toHaveBeenCalledOnce()
  })

  it('leaves a press with a modifier key to the browser', () => {
    const pressed = vi.fn()
    render(<Button label="Open" href="#sheets" onPress={pressed} />)

    const wasLeft = fireEvent.click(screen.getByRole('link', { name: 'Open' }), { ctrlKey: true })

    expect(wasLeft).toBe(true)
    expect(pressed).not.toHaveBeenCalled()
  })
})
