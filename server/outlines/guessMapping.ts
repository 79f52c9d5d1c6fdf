import type { AttributeMapping } from '@/shared/schemas/outline'
import type { Attributes } from './outlines.types'
import { isReadableAs, OUR_NAMES } from './readRegister'

const SAMPLE = 500
const READABLE_SHARE = 0.5
const UNIQUE_SHARE = 0.9

/** Names under which registers keep what we ask for; the first pattern that a name meets weighs most. */
const patterns: Readonly<Record<keyof AttributeMapping, readonly RegExp[]>> = {
  reference: [
    /^(ref|reference|referentie|référence|building.?(id|no|nr)|object.?id|identificatie\w*|geb(ä|ae)ude.?id|gml.?id|uuid|egid)$/,
    /^(id|gid|fid|osm.?id|code|nr|nummer)$/,
  ],
  street: [
    /^(street|streetname|strasse|straße|straat|straatnaam|rue|addr.street|openbareruimte\w*|str)$/,
    /street|stra(ss|ß)e|straat/,
  ],
  houseNumber: [/^(house.?(number|no|nr)|housenumber|huisnummer|hausnummer|hnr|addr.housenumber|numero|numéro)$/],
  year: [
    /^(year|built|year.?built|built.?year|baujahr|bouwjaar|construction.?year|year.?of.?construction|start.?date|annee|année|oorspronkelijkbouwjaar|annee.?construction|gbauj)$/,
    /(construction|built|bau|bouw).*(year|jahr|jaar|date)|(year|jahr|jaar).*(construction|built|bau|bouw)/,
  ],
  storeys: [
    /^(storeys?|stories|floors?|levels?|building.levels|no.?of.?(floors|storeys)|geschosse|geschosszahl|stockwerke|anzahl.?geschosse|(aantal.?)?(bouwlagen|verdiepingen|woonlagen)|etages?|nb.?etages|gastw)$/,
    /storey|floors|levels|geschoss|bouwlag/,
  ],
  heightM: [
    /^(height|height.?m|building.?height|measured.?height|gebäudehöhe|hoehe|höhe|hoogte|hauteur)$/,
    /height|hoehe|höhe|hoogte|hauteur/,
  ],
  use: [
    /^(use|usage|function|building.use|gebruiksdoel\w*|nutzung|gebäudefunktion|gebaeudefunktion|functie|type|building|class|occupancy)$/,
    /use|function|nutz|gebruik|usage/,
  ],
}
/** Parts of names that speak of something else: a lower edge, a share, when the row was written. */
const elsewhere =
  /min|ground|roof|base|surface|boden|maaiveld|creat|modif|update|register|status|count|share|area|fläche|oppervlak/

/**
 * Offers which attribute of a file means which of ours, from its name and its values. Only an offer: a person looks at
 * it before anything is imported.
 */
export function guessMapping(rows: readonly Attributes[]): AttributeMapping {
  const sample = rows.slice(0, SAMPLE)
  const names = [...new Set(sample.flatMap((row) => Object.keys(row)))]
  const taken = new Set<string>()
  const guess: AttributeMapping = {
    reference: null,
    street: null,
    houseNumber: null,
    year: null,
    storeys: null,
    heightM: null,
    use: null,
  }
  for (const ours of OUR_NAMES) {
    const ranked = names
      .filter((name) => !taken.has(name))
      .map((name) => ({ name, weight: weightOf(ours, name, sample) }))
      .sort((one, other) => other.weight - one.weight)
    const [best] = ranked
    if (best === undefined || best.weight === 0) continue
    guess[ours] = best.name
    taken.add(best.name)
  }
  return guess
}

function weightOf(ours: keyof AttributeMapping, name: string, sample: readonly Attributes[]): number {
  const plain = separated(name)
  const rank = patterns[ours].findIndex((pattern) => pattern.test(plain))
  if (rank < 0 || (rank > 0 && elsewhere.test(plain))) return 0
  const values = sample.map((row) => row[name]).filter((value) => value !== undefined)
  const readable = values.filter((value) => isReadableAs(ours, value))
  if (values.length === 0 || readable.length / values.length < READABLE_SHARE) return 0
  if (ours === 'reference' && new Set(values).size / values.length < UNIQUE_SHARE) return 0
  return 1 / (rank + 1) + (readable.length / sample.length) * 0.1
}

/** `measuredHeight`, `Measured-Height` and `measured_height` are one name. */
function separated(name: string): string {
  return name
    .replace(/([a-zà-ÿ])([A-ZÀ-Ý])/g, '$1_$2')
    .toLowerCase()
    .replace(/[\s:.\-]+/g, '_')
}
