export interface RunningService {
  readonly url: string;
  readonly pid: number | undefined;
  readonly exited: Promise<string>;
  stop(patience?: number): Promise<void>;
}
interface Common {
  dataDir: string;
  compiled: boolean;
  logDir?: string;
}
export const projectDir: string;
export function startSearch(
  options: Common & { port: number; key: string },
): Promise<RunningService & { readonly key: string }>;
export function startMailbox(
  options: Common & { smtpPort: number; pagePort: number },
): Promise<RunningService & { readonly pageUrl: string }>;
export function programArguments(file: string, compiled: boolean): string[];
export function answers(url: string): Promise<boolean>;
