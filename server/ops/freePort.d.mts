/** The port, when something could listen on it now; 0 asks for any. */
export function tryPort(port: number, host?: string): Promise<number | undefined>
