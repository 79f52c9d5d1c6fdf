import type { ClusterSecrets } from './cluster.mjs'

export function readSecrets(file: string): ClusterSecrets & { readonly sessionSecret: string }
