import type { Scope } from '@/server/database'
import { conflictWith, notFound, unusable } from '@/server/errors'
import { presentReceiptSources } from '@/server/presenters/presentReceiptSources'
import { lifetimesOf } from '@/server/run/lifetimesOf'
import { receiptParts, type ReceiptBasis, type YearPlaces } from '@/server/run/receiptParts'
import type { RunInputs } from '@/server/run/runInputs.types'
import { sliceBuildings } from '@/server/run/sliceBuildings'
import { computeDistrict } from '@/shared/compute/run/computeDistrict'
import { sum } from '@/shared/compute/sum'
import type { FullEdition } from '@/shared/schemas/factorBook'
import type { Receipt, ReceiptFigure } from '@/shared/schemas/receipt'
import type { RunResult, RunSummary } from '@/shared/schemas/run'
import { readFullEdition } from './readEditions'
import { readRunResult, readRunSummary } from './readRuns'

/** Parts that differ from their figure by more than this share of it are not its parts. */
const ROUNDING_SHARE = 1e-9

interface Opened {
  readonly basis: ReceiptBasis
  readonly edition: FullEdition
}
/** A finished run never changes, so what was computed of it stays right; a few, because readers stay with one. */
const opened = new Map<string, Opened>()
const MOST_OPENED = 3

/**
 * A figure of a finished run down to its parts, from the inputs that were frozen with it.
 *
 * @throws {Refusal} `not-found`, `run-not-done`, `input-not-usable` for years outside the run, `receipt-does-not-add-up`
 */
export async function readReceipt(scope: Scope, runId: string, figure: ReceiptFigure): Promise<Receipt> {
  const run = await readRunSummary(scope, runId)
  const result = await readRunResult(scope, runId)
  if (!result)
    throw conflictWith('run-not-done', 'This run is not done, so it has no figures yet. Wait for it or start another.')
  const places = placesOfYears(figure, result)
  const { basis, edition } = await openRun(scope, run)
  if (figure.buildingId !== null && !basis.inputs.sheets.some(({ buildingId }) => buildingId === figure.buildingId))
    throw notFound('building in this run')
  const parts = receiptParts(basis, figure, places)
  const stated = statedFigure(figure, result, places)
  if (stated && Math.abs(parts.massKg - stated.massKg) > ROUNDING_SHARE * Math.max(1, stated.massKg)) {
    throw conflictWith(
      'receipt-does-not-add-up',
      `The parts do not add up to the figure: it was computed by version ${run.engineVersion} of the engine. The figure stays as it was; start a new run to get its receipt.`,
    )
  }
  return {
    run,
    figure,
    massKg: stated?.massKg ?? parts.massKg,
    band: stated?.band ?? null,
    groups: [...parts.groups],
    buildings: [...parts.buildings],
    ...presentReceiptSources(parts.groups, basis, edition, figure),
  }
}

async function openRun(scope: Scope, { runId, editionId }: RunSummary): Promise<Opened> {
  const known = opened.get(runId)
  if (known) return known
  const [row] = await scope.select<{ inputs: RunInputs }>(
    `SELECT inputs FROM run WHERE organisation_id = $organisationId AND run_id = $runId`,
    { organisationId: scope.organisationId, runId },
  )
  if (!row) throw notFound('run')
  const { inputs } = row
  const edition = await readFullEdition(scope, editionId)
  const { intensities, lifetimes } = edition.rows
  const { scenario, surveyYear, sheets } = inputs
  const sliced = sliceBuildings(sheets, scenario)
  const { horizonYears, yearOffset } = scenario
  const conventions = { surveyYear, horizonYears, yearOffset }
  const district = computeDistrict(sliced.buildings, intensities, lifetimesOf(lifetimes, scenario), conventions)
  const made = { basis: { inputs, sliced, district, intensities }, edition }
  opened.set(runId, made)
  const [oldest] = opened.keys()
  if (opened.size > MOST_OPENED && oldest !== undefined) opened.delete(oldest)
  return made
}

function placesOfYears({ kind, fromYear, toYear }: ReceiptFigure, { yearsAhead: { years } }: RunResult): YearPlaces {
  if (kind === 'stock') return { first: 0, last: 0 }
  const [first, last] = [years.indexOf(fromYear ?? NaN), years.indexOf(toYear ?? NaN)]
  if (first >= 0 && last >= first) return { first, last }
  const span = `${years[0]} to ${years.at(-1)}`
  throw unusable(`A flow has years of this run, ${span}, the first not after the last. Choose them within it.`, [
    {
      pointer: '/query/fromYear',
      code: 'years-not-of-run',
      detail: `${fromYear ?? '–'} to ${toYear ?? '–'} is not within ${span}.`,
    },
  ])
}

interface Stated {
  readonly massKg: number
  readonly band: Receipt['band']
}

/** The figure as the run states it; null for a part of one, which no table of the run holds. */
function statedFigure(figure: ReceiptFigure, result: RunResult, places: YearPlaces): Stated | null {
  const { kind, use, structure, period, buildingId } = figure
  if ([use, structure, period, buildingId].some((part) => part !== null)) return null
  return kind === 'stock' ? statedStock(figure, result) : statedFlow(figure, kind, result, places)
}

function statedStock({ material }: ReceiptFigure, { stock }: RunResult): Stated | null {
  const band = material === 'all' ? stock.total : stock.byMaterial.find((one) => one.material === material)?.band
  return band ? { massKg: band.meanKg, band: { p10Kg: band.p10Kg, p90Kg: band.p90Kg } } : null
}

function statedFlow(
  { material }: ReceiptFigure,
  kind: 'demolition' | 'refurbishment',
  { yearsAhead }: RunResult,
  { first, last }: YearPlaces,
): Stated | null {
  const series = material === 'all' ? yearsAhead[kind].total : yearsAhead[kind].byMaterial[material]
  if (!series) return null
  // bands of single years cannot be added: the run states that of one year, and of all demolition from the first year on
  const isCumulative = kind === 'demolition' && material === 'all' && first === 0
  const banded = first === last ? series : isCumulative ? yearsAhead.cumulative : null
  return {
    massKg: sum(series.meanKg.slice(first, last + 1)),
    band: banded ? { p10Kg: banded.p10Kg[last]!, p90Kg: banded.p90Kg[last]! } : null,
  }
}
