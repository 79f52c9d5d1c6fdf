import type { Outline } from '@/shared/schemas/outline'

/** How an outline is called: its address, else the reference of the register. */
export function outlineName({ street, houseNumber, reference }: Outline): string {
  return street === null ? reference : [street, houseNumber].filter((part) => part !== null).join(' ')
}
