export function readPort(environment?: Readonly<Record<string, string | undefined>>): number
export function hasOwnDatabase(environment?: Readonly<Record<string, string | undefined>>): boolean
