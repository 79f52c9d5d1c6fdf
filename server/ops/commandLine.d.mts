/** Runs a command of the built server; what its last line holds as JSON. */
export function runServerCommand(command: string, environment: NodeJS.ProcessEnv): Promise<unknown>
