import common from './de/common.json'
import nav from './de/nav.json'

/** The German catalogue, in the nesting of the English one. */
export const de = { common, nav }
