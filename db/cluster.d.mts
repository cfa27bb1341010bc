export interface Cluster {
  readonly port: number;
  /** As the superuser, on the database `postgres`. */
  readonly adminUrl: string;
  /** As the role that owns and migrates the database `vatwright`. */
  readonly ownerUrl: string;
  /** As the application's role, under row-level security. */
  readonly appUrl: string;
  stop(): Promise<void>;
}

/** A failure whose message is one line that tells a person what to do. */
export class Failure extends Error {}

export function clusterPort(env?: NodeJS.ProcessEnv): number;
export function startCluster(port?: number): Promise<Cluster>;
export function stopCluster(): void;
export function clusterRunning(): number | undefined;
export function startTestCluster(): Promise<Cluster>;
/** The full path of one of PostgreSQL's programs with the environment it needs. */
export function program(name: string): { path: string; env: NodeJS.ProcessEnv };
