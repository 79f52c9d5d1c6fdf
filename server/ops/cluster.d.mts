export interface ClusterSecrets {
  readonly superuserPassword: string
  readonly ownerPassword: string
  readonly appPassword: string
}

export interface Cluster {
  readonly port: number
  readonly appUrl: string
  readonly ownerUrl: string
  readonly adminUrl: string
  stop(): Promise<void>
}

export function clusterFolder(root: string): string
export function startCluster(options: {
  readonly folder: string
  readonly secrets: ClusterSecrets
  readonly isThrowAway?: boolean
}): Promise<Cluster>
export function stopCluster(folder: string): Promise<void>
export function clusterPort(folder: string): Promise<number | undefined>
export function isAlive(pid: number): boolean
