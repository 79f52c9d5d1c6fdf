import type { Migration } from './tenantTable'

/** Finds the outlines of a block, and of an import, without reading the whole district. */
export const m0005OutlineBlocks: Migration = {
  name: '20261201-0005-outline-blocks',
  up: `
    CREATE INDEX outline_block ON outline (organisation_id, block_id);
    CREATE INDEX round_building_outline ON round_building (organisation_id, outline_id);
  `,
  down: `
    DROP INDEX outline_block, round_building_outline;
  `,
}
