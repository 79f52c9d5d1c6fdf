interface Named {
  readonly street: string | null
  readonly houseNumber: string | null
  readonly reference: string
}

/** What a person calls a building: street and number, else its reference. */
export function buildingLabel({ street, houseNumber, reference }: Named): string {
  return street ? [street, houseNumber].filter(Boolean).join(' ') : reference
}
