import type { Messages } from '@/shared/messages/messages.types'
import type { ChosenLookFigure } from '@/shared/schemas/nextLook'

/** A figure in words: "timber coming down by 2040". */
export function lookFigureText({ material, byYear }: ChosenLookFigure, t: Messages['t']): string {
  const name = material === 'all' ? t('nextLook.allMaterials') : t(`vocabulary.material.${material}`)
  return byYear === null
    ? t('nextLook.figureStock', { material: name })
    : t('nextLook.figureAhead', { material: name, year: String(byYear) })
}
