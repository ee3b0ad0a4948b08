export interface RunningMariaDb {
  readonly url: string;
  readonly pid: number | undefined;
  readonly exited: Promise<string>;
  stop(patience?: number): Promise<void>;
}
export function startMariaDb(options: {
  dataDir: string;
  port: number;
  logDir?: string;
}): Promise<RunningMariaDb>;
export function findProgram(program: string): string | undefined;
