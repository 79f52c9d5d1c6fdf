import { act, cleanup, fireEvent, render, screen } from '@testing-library/react'
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest'
import { AllWellDialog } from './AllWellDialog'
import { dialable, msUntilAsked, parseWalk, type Walk } from './walk'
import { WalkPanel } from './WalkPanel'

const walk: Walk = { startedAtMs: 0, lastWellAtMs: 60_000, askEveryMinutes: 15, callName: 'A', callNumber: '12 34' }

describe('a walk', () => {
  it('is asked about after its time, and never where no time was chosen', () => {
    expect(msUntilAsked(walk, 60_000)).toBe(900_000)
    expect(msUntilAsked(walk, 961_000)).toBe(-1_000)
    expect(msUntilAsked({ ...walk, askEveryMinutes: null }, 961_000)).toBeNull()
  })

  it('is read back as it was kept, and anything else is no walk', () => {
    expect(parseWalk(JSON.stringify(walk))).toEqual(walk)
    for (const text of [null, '', '{', '{"startedAtMs":"x"}']) expect(parseWalk(text)).toBeNull()
  })

  it('names a number a phone can dial', () => {
    expect(dialable('+49 (0)40 123-45')).toBe('+4904012345')
    expect(dialable('the desk')).toBeNull()
  })
})

describe('the walk on the screen', () => {
  beforeEach(() => void vi.useFakeTimers())
  afterEach(() => {
    cleanup()
    vi.useRealTimers()
  })

  it('asks "All well?" when the time is up, shows whom to call, and asks again only after another while', () => {
    render(
      <>
        <WalkPanel />
        <AllWellDialog />
      </>,
    )
    fireEvent.click(screen.getByRole('button', { name: 'Start a walk' }))
    fireEvent.click(screen.getByRole('radio', { name: '15 minutes' }))
    fireEvent.change(screen.getByLabelText('Whom to call'), { target: { value: 'The desk' } })
    fireEvent.change(screen.getByLabelText('Their number'), { target: { value: '0123 456' } })
    fireEvent.click(screen.getByRole('button', { name: 'Start now' }))
    expect(screen.queryByText('All well?')).toBeNull()

    act(() => void vi.advanceTimersByTime(15 * 60_000 + 30_000))
    expect(screen.getByText('All well?')).toBeTruthy()
    expect(screen.getByText(/The desk, 0123 456/)).toBeTruthy()

    fireEvent.click(screen.getByRole('button', { name: 'Yes, all well' }))
    expect(screen.queryByText('All well?')).toBeNull()
    fireEvent.click(screen.getByRole('button', { name: 'End the walk' }))
    act(() => void vi.advanceTimersByTime(60 * 60_000))
    expect(screen.queryByText('All well?')).toBeNull()
  })
})
