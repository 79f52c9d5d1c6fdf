import { wasteCodeEntry } from '@/shared/compute/waste/wasteCodeEntry'
import type { CodeComparison, Inventory } from '@/shared/schemas/listing'

/** What the weighbridge said of one code. */
export interface WeighedCode {
  readonly code: string
  readonly massKg: number
  readonly tickets: number
}

/**
 * Expected masses beside weighed ones, code by code, also those of which only one is known. Low and high are added up,
 * because the errors of one building's floor area are shared by its materials.
 */
export function compareWithTickets({ lines }: Inventory, weighed: readonly WeighedCode[]): CodeComparison[] {
  const codes = [...new Set([...lines.map(({ code }) => code), ...weighed.map(({ code }) => code)])].sort()
  return codes.map((code) => {
    const expectedKg = { low: 0, likely: 0, high: 0 }
    for (const { massKg } of lines.filter((line) => line.code === code)) {
      expectedKg.low += massKg.low
      expectedKg.likely += massKg.likely
      expectedKg.high += massKg.high
    }
    const found = weighed.find((one) => one.code === code)
    return {
      code,
      text: wasteCodeEntry(code).text,
      expectedKg,
      weighedKg: found?.massKg ?? null,
      tickets: found?.tickets ?? 0,
    }
  })
}
