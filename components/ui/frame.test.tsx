import { act, cleanup, fireEvent, render, screen, within } from '@testing-library/react'
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest'
import { AppFrame } from './AppFrame'
import type { NavEntry } from './AppFrame.types'
import { AppText } from './AppText'
import { DataTable, type Column } from './DataTable'
import { Dialog } from './Dialog'
import { Notice } from './Notice'
import { Panel } from './Panel'
import { Progress } from './Progress'
import { Screen } from './Screen'
import { TitleBlock } from './TitleBlock'
import { ToastProvider, useToast } from './Toast'

afterEach(cleanup)

function setWidth(widthPx: number): void {
  Object.defineProperty(document.documentElement, 'clientWidth', { value: widthPx, configurable: true })
  act(() => void window.dispatchEvent(new Event('resize')))
}

const entries: NavEntry[] = ['today', 'street', 'bag', 'me', 'district', 'stock'].map((name) => ({
  href: `/${name}`,
  label: name,
  icon: 'home',
  badge: name === 'bag' ? 6 : 0,
}))

describe('AppFrame', () => {
  beforeEach(() => setWidth(1440))

  it('has one navigation, one header and one main part', () => {
    render(
      <AppFrame entries={entries} currentPath="/bag" onNavigate={() => {}}>
        <Screen title="Bag">
          <AppText>six sheets</AppText>
        </Screen>
      </AppFrame>,
    )

    expect(screen.getAllByRole('navigation')).toHaveLength(1)
    expect(within(screen.getByRole('banner')).getByRole('heading', { level: 1 }).textContent).toBe('Bag')
    expect(within(screen.getByRole('main')).getByText('six sheets')).toBeTruthy()
    expect(document.title).toBe('Bag · Tallystone')
  })

  it('marks the current entry and says how many wait', () => {
    render(
      <AppFrame entries={entries} currentPath="/bag/sheets" onNavigate={() => {}}>
        <></>
      </AppFrame>,
    )

    const current = screen.getByRole('link', { name: 'bag, 6 waiting' })

    expect(current.getAttribute('aria-current')).toBe('page')
    expect(screen.getByRole('link', { name: 'today' }).getAttribute('aria-current')).toBeNull()
  })

  it('keeps the foot behind "More" on a phone where it is asked for', () => {
    setWidth(390)
    render(
      <AppFrame
        entries={entries.slice(0, 1)}
        currentPath="/today"
        onNavigate={() => {}}
        foot={<AppText>the way out</AppText>}
        hasFootOnPhone
      >
        <></>
      </AppFrame>,
    )
    expect(screen.queryByText('the way out')).toBeNull()

    fireEvent.click(screen.getByRole('link', { name: 'More' }))

    expect(screen.getByText('the way out')).toBeTruthy()
  })

  it('leads the keyboard past the navigation', () => {
    render(
      <AppFrame entries={entries} currentPath="/today" onNavigate={() => {}}>
        <Screen title="Today">
          <></>
        </Screen>
      </AppFrame>,
    )

    fireEvent.click(screen.getByRole('link', { name: 'Skip to the content' }))

    expect(document.activeElement).toBe(screen.getByRole('main'))
  })

  it('keeps what does not fit under the thumb behind More', () => {
    setWidth(390)
    const navigated = vi.fn()
    render(
      <AppFrame entries={entries} currentPath="/stock" onNavigate={navigated}>
        <></>
      </AppFrame>,
    )
    expect(screen.queryByRole('link', { name: 'stock' })).toBeNull()

    const more = screen.getByRole('link', { name: 'More' })
    expect(more.getAttribute('aria-current')).toBe('page')
    fireEvent.click(more)
    fireEvent.click(within(screen.getByRole('dialog')).getByRole('link', { name: 'stock' }))

    expect(navigated).toHaveBeenCalledWith('/stock')
  })
})

describe('Dialog', () => {
  it('is named by its title and closes with Escape', () => {
    const closed = vi.fn()
    render(
      <Dialog title="Send back?" isOpen onClose={closed}>
        <AppText>With a question.</AppText>
      </Dialog>,
    )
    expect(screen.getByRole('dialog', { name: 'Send back?' })).toBeTruthy()

    fireEvent.keyUp(document, { key: 'Escape' })

    expect(closed).toHaveBeenCalledOnce()
  })

  it('is not there while it is closed', () => {
    render(
      <Dialog title="Send back?" isOpen={false} onClose={() => {}}>
        <></>
      </Dialog>,
    )

    expect(screen.queryByRole('dialog')).toBeNull()
  })
})

describe('DataTable', () => {
  interface Row {
    readonly name: string
    readonly massT: number
  }
  const rows: Row[] = [
    { name: 'timber', massT: 1290 },
    { name: 'concrete', massT: 10_700 },
    { name: 'steel', massT: 920 },
  ]
  const columns: Column<Row>[] = [
    { key: 'name', head: 'material', cell: (row) => row.name },
    { key: 'mass', head: 'stands, t', align: 'right', cell: (row) => String(row.massT), sortBy: (row) => row.massT },
  ]
  const namesInOrder = (): (string | null | undefined)[] =>
    screen
      .getAllByRole('row')
      .slice(1)
      .map((row) => within(row).getAllByRole('cell')[0]?.textContent)

  it('is a table to screen readers', () => {
    render(<DataTable label="Stock" columns={columns} rows={rows} rowKey={(row) => row.name} />)

    const table = screen.getByRole('table', { name: 'Stock' })

    expect(within(table).getAllByRole('columnheader')).toHaveLength(2)
    expect(namesInOrder()).toEqual(['timber', 'concrete', 'steel'])
  })

  it('sorts figures from the largest down, then up', () => {
    render(<DataTable label="Stock" columns={columns} rows={rows} rowKey={(row) => row.name} />)
    const sorter = screen.getByRole('button', { name: 'Sort by stands, t' })

    fireEvent.click(sorter)
    expect(namesInOrder()).toEqual(['concrete', 'timber', 'steel'])
    expect(screen.getAllByRole('columnheader')[1]?.getAttribute('aria-sort')).toBe('descending')

    fireEvent.click(sorter)
    expect(namesInOrder()).toEqual(['steel', 'timber', 'concrete'])
  })

  it('opens a row once for one press', () => {
    const opened = vi.fn()
    render(
      <DataTable
        label="Stock"
        columns={columns}
        rows={rows}
        rowKey={(row) => row.name}
        onPressRow={opened}
        rowLabel={(row) => `Open ${row.name}`}
      />,
    )

    fireEvent.click(screen.getByRole('button', { name: 'Open steel' }))

    expect(opened).toHaveBeenCalledOnce()
    expect(opened).toHaveBeenCalledWith(rows[2])
  })

  it('draws a page at first and the rest when asked', () => {
    render(<DataTable label="Stock" columns={columns} rows={rows} rowKey={(row) => row.name} pageSize={2} />)

    fireEvent.click(screen.getByRole('button', { name: 'Show 1 more' }))

    expect(namesInOrder()).toHaveLength(3)
  })

  it('offers the CSV and the totals', () => {
    const saved = vi.fn()
    render(
      <DataTable
        label="Stock"
        columns={columns}
        rows={rows}
        rowKey={(row) => row.name}
        onSaveCsv={saved}
        totals={{ name: 'total', mass: '12,910' }}
      />,
    )

    fireEvent.click(screen.getByRole('button', { name: 'Save as CSV: Stock' }))

    expect(saved).toHaveBeenCalledOnce()
    expect(screen.getByText('12,910')).toBeTruthy()
  })

  it('gives its place to what is said when there are no rows', () => {
    render(
      <DataTable
        label="Stock"
        columns={columns}
        rows={[]}
        rowKey={(row) => row.name}
        empty={<AppText>Nothing yet</AppText>}
      />,
    )

    expect(screen.queryByRole('table')).toBeNull()
    expect(screen.getByText('Nothing yet')).toBeTruthy()
  })
})

describe('words', () => {
  it('names a panel by its title', () => {
    render(<Panel title="Your beat" note="41 of 118 buildings" />)

    expect(screen.getByRole('region', { name: 'Your beat' })).toBeTruthy()
    expect(screen.getByRole('heading', { level: 2 }).textContent).toBe('Your beat')
  })

  it('reads an urgent notice out at once', () => {
    render(<Notice urgent whatHappened="The server did not answer." whatIsSafe="All is kept." whatToDo="Try again." />)

    expect(screen.getByRole('alert').textContent).toBe('The server did not answer.All is kept.Try again.')
  })

  it('says how far a piece of work has come', () => {
    render(<Progress label="Handing in" share={0.424} note="6 of 14 photos" />)

    const bar = screen.getByRole('progressbar', { name: 'Handing in' })

    expect(bar.getAttribute('aria-valuenow')).toBe('42')
    expect(bar.getAttribute('aria-valuetext')).toBe('6 of 14 photos')
  })

  it('groups the cells of a title block', () => {
    render(<TitleBlock cells={[{ label: 'rev', value: 'C' }]} />)

    expect(screen.getByRole('group', { name: 'Title block' }).textContent).toBe('revC')
  })

  it('shows a toast, reads it out and lets it go', () => {
    function Done() {
      const showToast = useToast()
      return <AppText onPress={() => showToast('Handed in.')}>hand in</AppText>
    }
    render(
      <ToastProvider>
        <Done />
      </ToastProvider>,
    )

    fireEvent.click(screen.getByText('hand in'))
    expect(screen.getByRole('status').textContent).toContain('Handed in.')
    fireEvent.click(screen.getByRole('button', { name: 'Close' }))

    expect(screen.queryByText('Handed in.')).toBeNull()
  })
})
