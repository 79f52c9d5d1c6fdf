/** A cluster for tests in a temporary folder; `stop` also removes it. `adminUrl` is a superuser's address. */
export function startThrowAwayCluster(): Promise<{ adminUrl: string; stop(): Promise<void> }>
