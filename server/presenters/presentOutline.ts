import type { Outline, RegisterAttributes } from '@/shared/schemas/outline'

/** Columns of {@link OutlineRow}, for a SELECT that calls the table of outlines `o`. */
export const OUTLINE_COLUMNS = `o.outline_id, o.reference, o.street, o.house_number, o.footprint_m2, o.block_id,
  o.register_year, o.register_storeys, o.register_height_m, o.register_use`

/** SQL of an outline's geometry as GeoJSON: a polygon where it has one part. */
export const OUTLINE_GEOMETRY = `ST_AsGeoJSON(
  CASE WHEN ST_NumGeometries(o.geometry) = 1 THEN ST_GeometryN(o.geometry, 1) ELSE o.geometry END, 7)::json`

export interface OutlineRow {
  outline_id: string
  reference: string
  street: string | null
  house_number: string | null
  footprint_m2: number
  block_id: string | null
  register_year: number | null
  register_storeys: number | null
  register_height_m: number | null
  register_use: RegisterAttributes['use']
}

export function presentOutline(row: OutlineRow): Outline {
  return {
    outlineId: row.outline_id,
    reference: row.reference,
    street: row.street,
    houseNumber: row.house_number,
    footprintM2: row.footprint_m2,
    blockId: row.block_id,
    register: {
      year: row.register_year,
      storeys: row.register_storeys,
      heightM: row.register_height_m,
      use: row.register_use,
    },
  } satisfies Outline
}
