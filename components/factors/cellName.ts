import {
  AREA_BASES,
  PROVENANCES,
  STRUCTURES,
  USES,
  type AreaBasis,
  type Provenance,
  type Structure,
  type Use,
} from '@/shared/compute/factors/vocabulary'
import type { Messages } from '@/shared/messages/messages.types'
import { factorNames } from './factorNames'

const isOf =
  <Word extends string>(words: readonly Word[]) =>
  (word: string): word is Word =>
    words.some((known) => known === word)
const isUse = isOf<Use>(USES)
const isStructure = isOf<Structure>(STRUCTURES)
const isBasis = isOf<AreaBasis>(AREA_BASES)
const isProvenance = isOf<Provenance>(PROVENANCES)

/** Name of a word of a column with a closed list; a word without one stands as it is. */
export function cellName(field: string, word: string, messages: Messages): string {
  const { t } = messages
  const names = factorNames(messages)
  if (word === 'all') return t('factorBook.any')
  switch (field) {
    case 'use':
      return isUse(word) ? names.use(word) : word
    case 'structure':
      return isStructure(word) ? names.structure(word) : word
    case 'material':
      return names.material(word)
    case 'period':
      return names.period(word)
    case 'component':
      return names.component(word)
    default:
      return kindName(field, word, messages)
  }
}

function kindName(field: string, word: string, { t }: Messages): string {
  if (field === 'areaBasis' && isBasis(word)) return t(`vocabulary.areaBasis.${word}`)
  return field === 'provenance' && isProvenance(word) ? t(`vocabulary.provenance.${word}`) : word
}
