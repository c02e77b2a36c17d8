/** A PostgreSQL cluster that runs. */
export interface Cluster {
  /** Connection URL of the superuser, to the database `postgres`. */
  readonly adminUrl: string;
  readonly port: number;
  readonly dir: string;
  /** Stops the server; removes the folder if it was a temporary one. */
  stop(): Promise<void>;
}

export interface ClusterOptions {
  /** The cluster's folder; without it a temporary one, removed by `stop`. */
  readonly dir?: string;
  /** False trades safety against power loss for speed (tests). */
  readonly durable?: boolean;
  /** Who runs it when we are root; `postgres` when not given. */
  readonly user?: string;
  /** The superuser's; needed again for a cluster that exists. */
  readonly password?: string;
}

export function startCluster(options?: ClusterOptions): Promise<Cluster>;
export function runningCluster(dir: string, password: string): string | undefined;
export function stopCluster(dir: string, options?: { readonly user?: string }): Promise<void>;
export function removeAbandonedClusters(): Promise<void>;
