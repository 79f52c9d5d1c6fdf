/** Kinds of brickwork whose courses a surveyor may count. */
export type BrickCoursing = 'metric-75' | 'normal-83' | 'thin-62' | 'block-250' | 'modular-68'

/** Height of one course with its bed joint, as bricklayers set it out; older work differs, so it stays editable. */
export const BRICK_COURSINGS: Readonly<Record<BrickCoursing, { courseMm: number; provenance: 'common-practice' }>> = {
  /** 65 mm brick with a joint of 10 mm: four courses to 300 mm. */
  'metric-75': { courseMm: 75, provenance: 'common-practice' },
  /** 71 mm brick with a joint of about 12 mm: twelve courses to the metre. */
  'normal-83': { courseMm: 83.3, provenance: 'common-practice' },
  /** 52 mm brick with a joint of about 10 mm: sixteen courses to the metre. */
  'thin-62': { courseMm: 62.5, provenance: 'common-practice' },
  /** Large blocks: four courses to the metre. */
  'block-250': { courseMm: 250, provenance: 'common-practice' },
  /** Three courses to eight inches. */
  'modular-68': { courseMm: 67.7, provenance: 'common-practice' },
}
