import { neymanAllocation, promisedStandardError, proportionalAllocation } from '@/shared/compute/survey/allocation'
import { frameCoverage } from '@/shared/compute/survey/coverage'
import { doubleMeasurement } from '@/shared/compute/survey/doubleMeasurement'
import { cohenKappa } from '@/shared/compute/survey/kappa'
import { ratioEstimate } from '@/shared/compute/survey/ratioEstimate'
import { sampleSizeForMean, sampleSizeForProportion } from '@/shared/compute/survey/sampleSize'
import { stratifiedEstimate, type Estimate } from '@/shared/compute/survey/stratifiedEstimate'
import type { ConformanceMethod } from '@/tests/conformance/check.types'
import {
  isRecord,
  listOf,
  numberListsOf,
  numberOf,
  numbersOf,
  optionalNumberOf,
  type ConformanceInputs,
} from '@/tests/conformance/inputs'

const confidenceOf = (inputs: ConformanceInputs) => optionalNumberOf(inputs, 'confidence') ?? 0.95

function strataOf(inputs: ConformanceInputs): readonly ConformanceInputs[] {
  return listOf(inputs, 'strata').filter(isRecord)
}

const varianceOf = (inputs: ConformanceInputs) => optionalNumberOf(inputs, 's2') ?? numberOf(inputs, 's') ** 2

/** Total and mean under their names; `mean` and `se` alone may stand for either, as survey programs print them. */
function stratifiedFigures(inputs: ConformanceInputs) {
  const strata = strataOf(inputs).map((stratum) => ({
    frameCount: numberOf(stratum, 'N'),
    sampleCount: numberOf(stratum, 'n'),
    mean: numberOf(stratum, 'mean'),
    variance: varianceOf(stratum),
  }))
  const { total, mean, degreesOfFreedom } = stratifiedEstimate(strata, confidenceOf(inputs))
  const named = {
    total: total.value,
    se_total: total.standardError,
    se_mean: mean.standardError,
    ci95_total_t: total.intervalT,
    ci95_total_z: total.intervalZ,
    df: degreesOfFreedom,
  }
  const as = (estimate: Estimate) => ({
    ...named,
    mean: estimate.value,
    se: estimate.standardError,
    ci95_t: estimate.intervalT,
    ci95_z: estimate.intervalZ,
  })
  return { alternatives: [as(mean), as(total)] }
}

function srsFigures(inputs: ConformanceInputs) {
  const [frameCount, sampleCount] = [numberOf(inputs, 'N'), numberOf(inputs, 'n')]
  const { mean, total, degreesOfFreedom } = stratifiedEstimate(
    [{ frameCount, sampleCount, mean: numberOf(inputs, 'mean'), variance: varianceOf(inputs) }],
    confidenceOf(inputs),
  )
  return {
    mean: mean.value,
    se: mean.standardError,
    se_mean: mean.standardError,
    total: total.value,
    se_total: total.standardError,
    df: degreesOfFreedom,
    ci95_t: mean.intervalT,
    ci95_z: mean.intervalZ,
  }
}

function ratioFigures(inputs: ConformanceInputs) {
  const known = optionalNumberOf(inputs, 'X_total_known') ?? numberOf(inputs, 'X')
  if (inputs['x'] === undefined) {
    const ratio = numberOf(inputs, 'sum_y') / numberOf(inputs, 'sum_x')
    return { ratio, ratio_total: ratio * known, total: ratio * known }
  }
  const estimate = ratioEstimate(numbersOf(inputs, 'x'), numbersOf(inputs, 'y'), numberOf(inputs, 'N'), known)
  return {
    ratio: estimate.ratio,
    se: estimate.standardError,
    ratio_total: estimate.total,
    total: estimate.total,
    ratio_total_se: estimate.totalStandardError,
    se_total: estimate.totalStandardError,
  }
}

function allocationFigures(inputs: ConformanceInputs) {
  const n = numberOf(inputs, 'n')
  const strata = strataOf(inputs).map((stratum) => ({
    frameCount: numberOf(stratum, 'N'),
    sd: Math.sqrt(varianceOf(stratum)),
  }))
  const [proportional, neyman] = [proportionalAllocation(n, strata), neymanAllocation(n, strata)]
  return {
    proportional,
    neyman,
    se_proportional: promisedStandardError(proportional, strata),
    se_neyman: promisedStandardError(neyman, strata),
  }
}

function sampleSizeFigures(inputs: ConformanceInputs) {
  const frameCount = numberOf(inputs, 'N')
  const cv = optionalNumberOf(inputs, 'cv')
  const size =
    cv === undefined
      ? sampleSizeForProportion(
          frameCount,
          optionalNumberOf(inputs, 'p') ?? 0.5,
          numberOf(inputs, 'margin'),
          confidenceOf(inputs),
        )
      : sampleSizeForMean(
          frameCount,
          cv,
          optionalNumberOf(inputs, 'relative_margin') ?? numberOf(inputs, 'margin'),
          confidenceOf(inputs),
        )
  return { n0: size.infinite, n: size.finite, n_rounded: size.rounded }
}

function kappaFigures(inputs: ConformanceInputs) {
  const table = numberListsOf(inputs, 'table')
  const plain = cohenKappa(table)
  return {
    po: plain.observed,
    pe: plain.byChance,
    kappa: plain.kappa,
    se_simple: plain.simpleStandardError,
    se_fleiss_cohen_everitt_1969: plain.standardError,
    linear: cohenKappa(table, 'linear').kappa,
    quadratic: cohenKappa(table, 'quadratic').kappa,
  }
}

function agreementFigures(inputs: ConformanceInputs) {
  const [first, second] = [numbersOf(inputs, 'first'), numbersOf(inputs, 'second')]
  const plain = doubleMeasurement(first, second)
  return {
    tem: plain.technicalError,
    relative_tem_percent: 100 * plain.relativeTechnicalError,
    reliability: plain.reliability,
    bias: plain.bias,
    sd_diff: plain.sdOfDifferences,
    sd: plain.sdOfDifferences,
    loa_196: plain.limitsOfAgreement,
    loa_2: doubleMeasurement(first, second, { multiplier: 2 }).limitsOfAgreement,
  }
}

function coverageFigures(inputs: ConformanceInputs) {
  const covered = frameCoverage({
    frameCount: numberOf(inputs, 'frame'),
    surveyedCount: numberOf(inputs, 'surveyed'),
    frameAreaM2: numberOf(inputs, 'frame_area'),
    surveyedAreaM2: numberOf(inputs, 'surveyed_area'),
  })
  return {
    count_coverage: covered.countShare,
    area_coverage: covered.areaShare,
    remainder_area: covered.remainderM2,
    sampling_fraction_fpc: covered.finitePopulationCorrection,
  }
}

export const surveyMethods: Readonly<Record<string, ConformanceMethod>> = {
  'stratified-total': stratifiedFigures,
  'srs-mean': srsFigures,
  'ratio-estimate': ratioFigures,
  allocation: allocationFigures,
  'sample-size': sampleSizeFigures,
  kappa: kappaFigures,
  agreement: agreementFigures,
  coverage: coverageFigures,
}
