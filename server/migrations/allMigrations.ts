import { m0001People } from './m0001People'
import { m0002Field } from './m0002Field'
import { m0003Planning } from './m0003Planning'
import { m0004Sessions } from './m0004Sessions'
import { m0005OutlineBlocks } from './m0005OutlineBlocks'
import { m0006Sync } from './m0006Sync'
import { m0007SheetKeys } from './m0007SheetKeys'
import { m0008SheetRecorder } from './m0008SheetRecorder'
import { m0009EditionDrafts } from './m0009EditionDrafts'
import { m0011LookFigure } from './m0011LookFigure'
import { m0014BagSafety } from './m0014BagSafety'
import { m0014SheetKeysBack } from './m0014SheetKeysBack'
import { m0018YardPlan } from './m0018YardPlan'
import { m0019Listings } from './m0019Listings'
import type { Migration } from './tenantTable'

/** Every step of the schema in order; append only. */
export const allMigrations: readonly Migration[] = [
  m0001People,
  m0002Field,
  m0003Planning,
  m0004Sessions,
  m0005OutlineBlocks,
  m0006Sync,
  m0007SheetKeys,
  m0008SheetRecorder,
  m0009EditionDrafts,
  m0011LookFigure,
  m0014BagSafety,
  m0014SheetKeysBack,
  m0018YardPlan,
  m0019Listings,
]
