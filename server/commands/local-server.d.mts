/** See local-server.mjs. */
export interface StartedServer {
  readonly pid: number;
  /** Its exit code or the signal that ended it. */
  readonly ended: Promise<number | string>;
  readonly log: string;
  readonly ready: Promise<void>;
  readonly stop: () => Promise<void>;
}

export function startServer(options: {
  readonly env: Readonly<Record<string, string | undefined>>;
  readonly port: number;
  readonly host: string;
  readonly dataFolder: string;
  readonly nodeArgs?: readonly string[];
}): StartedServer;

export function lastLines(file: string, count?: number): string;
