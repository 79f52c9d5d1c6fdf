import packageFile from '@/package.json'

/** Version of the program, as answered by the health address. */
export const VERSION: string = packageFile.version
