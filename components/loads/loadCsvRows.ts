import type { WasteLine } from '@/shared/api/publications'

const LEVELS = ['low', 'likely', 'high'] as const

/** Waste lines for a CSV file with all digits, head first; a total has no year. */
export function loadCsvRows(
  lines: readonly (Omit<WasteLine, 'year'> & { readonly year?: number })[],
): (string | number | null)[][] {
  return [
    [
      'year',
      'waste_code',
      'text',
      'hazardous',
      'code_if_tested_hazardous',
      'materials',
      ...LEVELS.map((level) => `mass_${level}_kg`),
      ...LEVELS.map((level) => `loose_volume_${level}_m3`),
      ...LEVELS.map((level) => `loads_${level}`),
    ],
    ...lines.map((line) => [
      line.year ?? null,
      line.code,
      line.text,
      line.isHazardous ? 'yes' : 'no',
      line.mirrorHazardousCode,
      line.materials.join(' '),
      ...LEVELS.map((level) => line.massKg[level]),
      ...LEVELS.map((level) => line.looseVolumeM3[level]),
      ...LEVELS.map((level) => line.loads[level]),
    ]),
  ]
}
