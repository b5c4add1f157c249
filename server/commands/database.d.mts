/** See database.mjs, which runs as it stands, before any package is installed. */
export interface RunningDatabase {
  readonly folder: string;
  /** Of the application's own user on the database `ampwright`. */
  readonly url: string;
  /** The same user on another database; it may make any whose name begins with `ampwright_`. */
  readonly urlOf: (name: string) => string;
  readonly port: number;
  readonly password: string;
  readonly pid: number;
  /** True where this call made the data folder. */
  readonly made: boolean;
  /** True from the making of the data folder until `markUsed` is called: whatever stands in it is of no value yet. */
  readonly fresh: boolean;
  readonly markUsed: () => void;
  /** True where it ran already. */
  readonly shared: boolean;
  /** Lets go of it; the last one to do so ends it. */
  readonly stop: () => Promise<void>;
}

export function startDatabase(options: {
  readonly folder: string;
  readonly say?: (line: string) => void;
  /** False: a commit survives the death of the database but not of the machine; for tests. */
  readonly durable?: boolean;
}): Promise<RunningDatabase>;
