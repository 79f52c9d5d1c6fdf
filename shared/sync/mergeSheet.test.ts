import { describe, expect, it } from 'vitest'
import type { SheetAnswers } from '@/shared/schemas/sheet'
import { mergeChoice, settleByPlanner } from './mergeChoice'
import { mergeDeletion, mergeUndeletion } from './mergeDeletion'
import { mergeSheet, NEW_SHEET } from './mergeSheet'
import type { SheetRecord } from './sheetRecord.types'

const two: SheetAnswers = { storeys: { aboveGround: 2, knownBy: 'seen' } }
const three: SheetAnswers = { storeys: { aboveGround: 3, knownBy: 'seen' } }
const timber: SheetAnswers = { structure: { structure: 'timber-frame', knownBy: 'guessed' } }
const by = (deviceId: string, seen: number, change: number) => ({ deviceId, seen, change })

/** Ann wrote two storeys (change 10). */
const annsSheet: SheetRecord = mergeSheet(null, two, by('ann', 0, 10)).sheet
/** The planner checked what Ann wrote (change 20). */
const checked: SheetRecord = { ...annsSheet, state: 'checked', reviewChange: 20 }
/** The planner asked about what Ann wrote (change 20). */
const sentBack: SheetRecord = { ...annsSheet, state: 'sent-back', question: 'Is it three?', reviewChange: 20 }

describe('two devices write on one sheet', () => {
  it('F17 G1 writes what was seen as it stands', () => {
    const merged = mergeSheet(annsSheet, three, by('ben', 10, 11))

    expect(merged).toMatchObject({ setAside: [], isChanged: true })
    expect(merged.sheet).toMatchObject({ answers: three, versions: { storeys: 11 }, writers: { storeys: 'ben' } })
  })

  it('F17 G1 lets one device follow itself, whatever it had pulled meanwhile', () => {
    expect(mergeSheet(annsSheet, three, by('ann', 0, 11))).toMatchObject({ sheet: { answers: three }, setAside: [] })
  })

  it('F17 G2 keeps both when they wrote different groups', () => {
    const merged = mergeSheet(annsSheet, timber, by('ben', 0, 11))

    expect(merged.sheet.answers).toEqual({ ...two, ...timber })
    expect(merged.setAside).toEqual([])
  })

  it('F17 G3 says nothing about the same value twice, and leaves it to who wrote it first', () => {
    const merged = mergeSheet(annsSheet, two, by('ben', 0, 11))

    expect(merged).toEqual({ sheet: annsSheet, setAside: [], isChanged: false })
  })

  it('F17 G4 lets the later to arrive count and sets the earlier aside, with both devices', () => {
    const merged = mergeSheet(annsSheet, three, by('ben', 0, 11))

    expect(merged.sheet.answers).toEqual(three)
    expect(merged.setAside).toEqual([
      {
        group: 'storeys',
        kept: three.storeys,
        setAside: two.storeys,
        keptDeviceId: 'ben',
        setAsideDeviceId: 'ann',
      },
    ])
  })

  it('F17 G4 merges a group as one value: half of one and half of another never meet', () => {
    const here = mergeSheet(null, { position: { longitude: 8, latitude: 47, accuracyM: 5 } }, by('ann', 0, 10)).sheet
    const merged = mergeSheet(here, { position: { longitude: 9, latitude: 47, accuracyM: 50 } }, by('ben', 0, 11))

    expect(merged.sheet.answers.position).toEqual({ longitude: 9, latitude: 47, accuracyM: 50 })
    expect(merged.setAside).toMatchObject([{ setAside: { longitude: 8, latitude: 47, accuracyM: 5 } }])
  })

  it('F17 G4 contests only the groups that are contested', () => {
    const merged = mergeSheet(annsSheet, { ...three, ...timber }, by('ben', 0, 11))

    expect(merged.setAside.map(({ group }) => group)).toEqual(['storeys'])
    expect(merged.sheet.answers).toEqual({ ...three, ...timber })
  })
})

describe('writing after the planner spoke', () => {
  it.each([
    ['checked', checked],
    ['sent back', sentBack],
  ])('G5 raises the revision of a %s sheet and hands it in again when the word was seen', (_state, sheet) => {
    const merged = mergeSheet(sheet, three, by('ann', 20, 21))

    expect(merged.sheet).toMatchObject({ state: 'handed-in', revision: 2, question: null, answers: three })
    expect(mergeSheet(merged.sheet, timber, by('ann', 20, 22)).sheet.revision).toBe(2)
  })

  it('G5 takes the same answer again as an answer', () => {
    expect(mergeSheet(sentBack, two, by('ann', 20, 21)).sheet).toMatchObject({ state: 'handed-in', revision: 2 })
  })

  it('G5 leaves the question open when it was not seen', () => {
    const merged = mergeSheet(sentBack, three, by('ann', 10, 21))

    expect(merged.sheet).toMatchObject({ state: 'sent-back', revision: 1, question: 'Is it three?', answers: three })
    expect(merged.setAside).toEqual([])
  })

  it('F17 G6 makes a proposal of every other value when the check was not seen, even of its own author', () => {
    const merged = mergeSheet(checked, { ...three, ...timber }, by('ann', 10, 21))

    expect(merged).toMatchObject({ isChanged: false, sheet: checked })
    expect(merged.setAside).toEqual([
      {
        group: 'structure',
        kept: null,
        setAside: timber.structure,
        keptDeviceId: null,
        setAsideDeviceId: 'ann',
      },
      { group: 'storeys', kept: two.storeys, setAside: three.storeys, keptDeviceId: 'ann', setAsideDeviceId: 'ann' },
    ])
    expect(mergeSheet(checked, two, by('ann', 10, 21))).toMatchObject({ isChanged: false, setAside: [] })
  })

  it('F17 G6 makes a proposal of a contested group and takes the others when the check was seen', () => {
    const settled = settleByPlanner(
      checked,
      { group: 'storeys', setAside: three.storeys, choice: 'set-aside' },
      by('desk', 0, 30),
    )
    const merged = mergeSheet(settled.sheet, { ...two, ...timber }, by('ann', 20, 31))

    expect(merged.sheet).toMatchObject({ answers: { ...three, ...timber }, state: 'handed-in', revision: 2 })
    expect(merged.setAside).toMatchObject([{ group: 'storeys', kept: three.storeys, setAside: two.storeys }])
  })
})

describe('deleting', () => {
  const deleted = mergeDeletion(annsSheet, by('ann', 10, 12)).sheet

  it('G7 deletes what was seen, once, and takes it back as it was', () => {
    expect(deleted.deletion).toEqual({ change: 12, deviceId: 'ann' })
    expect(mergeDeletion(deleted, by('ben', 12, 13))).toMatchObject({ isChanged: false, sheet: deleted })
    expect(mergeUndeletion(deleted)).toEqual({ sheet: annsSheet, setAside: [], isChanged: true })
    expect(mergeUndeletion(annsSheet).isChanged).toBe(false)
  })

  it.each([
    ['somebody else wrote on meanwhile', annsSheet, by('ben', 0, 12)],
    ['is checked', checked, by('ann', 20, 21)],
    ['was sent back meanwhile', sentBack, by('ann', 10, 21)],
  ])('F17 G7 keeps a sheet that %s, and asks', (_case, sheet, writing) => {
    const merged = mergeDeletion(sheet, writing)

    expect(merged).toMatchObject({ sheet, isChanged: false })
    expect(merged.setAside).toEqual([
      {
        group: 'deletion',
        kept: { isDeleted: false },
        setAside: { isDeleted: true },
        keptDeviceId: 'ann',
        setAsideDeviceId: writing.deviceId,
      },
    ])
  })

  it('F17 G7 brings a sheet back for who did not know of the deletion, and asks', () => {
    const merged = mergeSheet(deleted, timber, by('ben', 10, 13))

    expect(merged.sheet).toMatchObject({ answers: { ...two, ...timber }, deletion: null })
    expect(merged.setAside).toMatchObject([
      { group: 'deletion', kept: { isDeleted: false }, setAside: { isDeleted: true }, setAsideDeviceId: 'ann' },
    ])
  })

  it.each([
    ['knew of the deletion', by('ben', 12, 13)],
    ['deleted it', by('ann', 10, 13)],
  ])('G7 begins a next revision for who %s', (_who, writing) => {
    const merged = mergeSheet(deleted, timber, writing)

    expect(merged.sheet).toMatchObject({ answers: timber, revision: 2, deletion: null, state: 'handed-in' })
    expect(merged.setAside).toEqual([])
  })
})

describe('settling a conflict', () => {
  const conflict = { group: 'storeys', setAside: two.storeys }
  const current = mergeSheet(annsSheet, three, by('ben', 0, 11)).sheet

  it('F17 G8 leaves the kept value, or writes the other one', () => {
    expect(mergeChoice(current, { ...conflict, choice: 'kept' }, by('ann', 12, 13)).isChanged).toBe(false)
    expect(mergeChoice(current, { ...conflict, choice: 'set-aside' }, by('ann', 12, 13)).sheet).toMatchObject({
      answers: two,
      versions: { storeys: 13 },
    })
  })

  it('G8 overwrites nothing that came after the conflict unseen', () => {
    const four: SheetAnswers = { storeys: { aboveGround: 4, knownBy: 'measured' } }
    const later = mergeSheet(current, four, by('cem', 12, 14)).sheet

    const merged = mergeChoice(later, { ...conflict, choice: 'set-aside' }, by('ann', 12, 15))

    expect(merged.setAside).toMatchObject([{ kept: two.storeys, setAside: four.storeys }])
  })

  it('G8 hands a checked sheet in again when a surveyor takes the proposal, but leaves it checked for a planner', () => {
    const choice = { group: 'storeys', setAside: three.storeys, choice: 'set-aside' } as const

    expect(mergeChoice(checked, choice, by('ann', 22, 23)).sheet).toMatchObject({ state: 'handed-in', revision: 2 })
    expect(settleByPlanner(checked, choice, by('desk', 0, 23)).sheet).toMatchObject({
      state: 'checked',
      revision: 1,
      answers: three,
      writers: { storeys: 'desk' },
    })
  })

  it('G8 settles a deletion, and takes no value that its group does not know', () => {
    const deletion = { group: 'deletion', setAside: { isDeleted: true }, choice: 'set-aside' } as const
    const unknown = { group: 'colour', setAside: 'red', choice: 'set-aside' } as const

    expect(settleByPlanner(checked, deletion, by('desk', 0, 23)).sheet.deletion).toEqual({
      change: 23,
      deviceId: 'desk',
    })
    expect(mergeChoice(annsSheet, deletion, by('ann', 12, 23)).sheet.deletion).toEqual({ change: 23, deviceId: 'ann' })
    expect(settleByPlanner(checked, unknown, by('desk', 0, 23))).toMatchObject({ isChanged: false, sheet: checked })
    expect(mergeChoice(annsSheet, { ...unknown, group: 'storeys' }, by('ann', 12, 23)).isChanged).toBe(false)
  })
})

it('F17 two orders of arrival end in one sheet each, and what differs is set aside in both', () => {
  const annFirst = mergeSheet(mergeSheet(null, two, by('ann', 0, 1)).sheet, three, by('ben', 0, 2))
  const benFirst = mergeSheet(mergeSheet(null, three, by('ben', 0, 1)).sheet, two, by('ann', 0, 2))

  expect(annFirst.setAside[0]).toMatchObject({ kept: three.storeys, setAside: two.storeys })
  expect(benFirst.setAside[0]).toMatchObject({ kept: two.storeys, setAside: three.storeys })
  expect(NEW_SHEET.answers).toEqual({})
})
