import type { ReceiptBasis } from '@/server/run/receiptParts'
import type { FullEdition } from '@/shared/schemas/factorBook'
import type { Receipt, ReceiptFigure, ReceiptGroup, ReceiptLifetime } from '@/shared/schemas/receipt'

/** The rows of the factor book that a figure rests on, each with its source. */
export function presentReceiptSources(
  groups: readonly ReceiptGroup[],
  basis: ReceiptBasis,
  { rows }: FullEdition,
  figure: ReceiptFigure,
): Pick<Receipt, 'factorRows' | 'lifetimes'> {
  const used = new Set(groups.flatMap(({ terms }) => terms.flatMap(({ rowIds }) => rowIds)))
  return {
    factorRows: rows.intensities
      .filter(({ rowId }) => used.has(rowId))
      .map(
        ({
          rowId,
          material,
          component,
          use,
          structure,
          period,
          meanKgPerM2,
          medianKgPerM2,
          sharedCv,
          sampleCount,
          source,
          provenance,
        }) => ({
          rowId,
          material,
          component,
          use,
          structure,
          period,
          meanKgPerM2,
          medianKgPerM2,
          sharedCv,
          sampleCount,
          source,
          provenance,
        }),
      ),
    lifetimes: figure.kind === 'stock' ? [] : lifetimesUsed(groups, basis, rows.lifetimes, figure),
  }
}

function lifetimesUsed(
  groups: readonly ReceiptGroup[],
  { district, inputs }: ReceiptBasis,
  rows: FullEdition['rows']['lifetimes'],
  { kind }: ReceiptFigure,
): ReceiptLifetime[] {
  const keys = new Set(groups.map(({ use, structure, period }) => `${use}|${structure}|${period}`))
  const archetypes = district.archetypes.filter(({ use, structure, period }) =>
    keys.has(`${use}|${structure}|${period}`),
  )
  const used = new Set(
    archetypes.flatMap(({ life, componentLives }) => [
      life.lifetimeId,
      ...(kind === 'refurbishment' ? Object.values(componentLives).map(({ lifetimeId }) => lifetimeId) : []),
    ]),
  )
  const { lifetimeOverrides } = inputs.scenario
  return rows
    .filter(({ rowId }) => used.has(rowId))
    .map((row): ReceiptLifetime => {
      const override =
        row.component === 'building'
          ? (lifetimeOverrides.find(({ use }) => use === row.use) ?? lifetimeOverrides.find(({ use }) => use === 'all'))
          : undefined
      const { model, meanYears, sdYears } = override ?? row
      const { rowId: lifetimeId, component, use, structure, source, provenance } = row
      return {
        lifetimeId,
        component,
        use,
        structure,
        model,
        meanYears,
        sdYears,
        isOfScenario: override !== undefined,
        source,
        provenance,
      }
    })
}
