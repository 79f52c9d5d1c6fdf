export function fingerprint(root: string, inputs: readonly string[]): string
export function isFresh(stampFile: string, print: string): boolean
export function writeStamp(stampFile: string, print: string): void
