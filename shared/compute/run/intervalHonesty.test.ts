import { expect, it } from 'vitest'
import type { IntensityFigure } from '@/shared/compute/factors/intensity.types'
import type { Structure } from '@/shared/compute/factors/vocabulary'
import { lifetimeFromMeanSd } from '@/shared/compute/lifetime/lifetimeFromMeanSd'
import { scaleLifetime } from '@/shared/compute/lifetime/scaleLifetime'
import { comingDownChances } from '@/shared/compute/stock/comingDownChances'
import { lognormalFromMean } from '@/shared/compute/uncertainty/lognormalFromMean'
import { seededRandom, type SeededRandom } from '@/shared/compute/uncertainty/seededRandom'
import { computeDistrict, type SurveyedBuilding } from './computeDistrict'
import { flowBand } from './flowBand'
import { massBand, type MassBand } from './massBand'
import type { LifetimeFigure } from './resolveArchetype'
import { totalVariance } from './stockOfCells'

const TOWNS = 500
const BUILDINGS = 400
const SURVEY_YEAR = 2026
const AREA_CV = 0.15
const LIFE_CV = 0.2
const FACTORS = [
  { structure: 'reinforced-concrete', meanKgPerM2: 1_500, cv: 0.22 },
  { structure: 'masonry-timber-floors', meanKgPerM2: 1_700, cv: 0.25 },
  { structure: 'timber-frame', meanKgPerM2: 700, cv: 0.3 },
] as const

const figures = FACTORS.map(({ structure, meanKgPerM2, cv }): IntensityFigure => ({
  rowId: structure,
  figureId: structure,
  use: 'all',
  structure,
  period: 'all',
  material: 'concrete',
  component: 'structure',
  areaBasis: 'GFA',
  meanKgPerM2,
  medianKgPerM2: null,
  gsdBetweenBuildings: null,
  sharedCv: cv,
  sampleCount: 50,
  source: 'this test',
  provenance: 'common-practice',
}))
const book: LifetimeFigure = {
  rowId: 'life',
  use: 'all',
  structure: 'all',
  component: 'building',
  model: 'weibull',
  meanYears: 110,
  sdYears: 45,
  sharedCv: LIFE_CV,
}
const bookLife = lifetimeFromMeanSd(book.model, book.meanYears, book.sdYears)

const lognormalDraw = (random: SeededRandom, mean: number, cv: number) => {
  const { logMean, logSd } = lognormalFromMean(mean, cv)
  return Math.exp(logMean + logSd * random.normal())
}

/** A town whose truth is drawn once, and the survey of it with its noise. */
function drawTown(random: SeededRandom) {
  const life = scaleLifetime(bookLife, Math.exp(Math.sqrt(Math.log1p(LIFE_CV ** 2)) * random.normal()))
  const trueFactor = new Map<Structure, number>(
    FACTORS.map(({ structure, meanKgPerM2, cv }) => [structure, lognormalDraw(random, meanKgPerM2, cv)]),
  )
  let stockKg = 0
  let tenYearsKg = 0
  const buildings = Array.from({ length: BUILDINGS }, (_, index): SurveyedBuilding => {
    const { structure } = FACTORS[Math.floor(random.uniform() * FACTORS.length)]!
    const year = 1890 + Math.floor(random.uniform() * 110)
    const seenM2 = 80 + 900 * random.uniform() ** 2
    const massKg = lognormalDraw(random, seenM2, AREA_CV) * trueFactor.get(structure)!
    stockKg += massKg
    const { chances } = comingDownChances(life, SURVEY_YEAR - year + 0.5, 10)
    if (random.uniform() < chances.reduce((total, chance) => total + chance, 0)) tenYearsKg += massKg
    return {
      buildingId: String(index),
      use: 'office',
      structure,
      yearFrom: year,
      yearTo: year,
      grossFloorAreaM2: seenM2,
      floorAreaCv: AREA_CV,
      hazardMultiplier: 1,
    }
  })
  return { buildings, stockKg, tenYearsKg }
}

const isInside = ({ p10Kg, p90Kg }: MassBand, truthKg: number) => truthKg >= p10Kg && truthKg <= p90Kg

it('covers the truth in 76 to 84 of a hundred towns, for the stock and for ten years of demolition', () => {
  const random = seededRandom(20261201)
  const covered = { stock: 0, tenYears: 0 }
  for (let town = 0; town < TOWNS; town++) {
    const { buildings, stockKg, tenYearsKg } = drawTown(random)
    const { stock, yearsAhead } = computeDistrict(buildings, figures, [book], {
      surveyYear: SURVEY_YEAR,
      horizonYears: 10,
      yearOffset: 0.5,
    })
    if (isInside(massBand(stock.total.meanKg, totalVariance(stock.total.varianceByCauseKg2)), stockKg))
      covered.stock += 1
    if (isInside(flowBand(yearsAhead.cumulativeDemolition, 9), tenYearsKg)) covered.tenYears += 1
  }
  console.info(
    `80 % interval over ${TOWNS} towns: stock ${covered.stock / TOWNS}, ten years of demolition ${covered.tenYears / TOWNS}`,
  )

  for (const share of [covered.stock / TOWNS, covered.tenYears / TOWNS]) {
    expect(share).toBeGreaterThanOrEqual(0.76)
    expect(share).toBeLessThanOrEqual(0.84)
  }
})
