export interface LaunchSettings {
  readonly production: boolean;
  readonly dataDir: string;
  readonly ports: Record<'app' | 'database' | 'search' | 'smtp' | 'mailbox' | 'pages', number>;
  readonly publicAddress: string;
  readonly environment: Record<string, string | undefined>;
}
export interface RunningStack {
  readonly address: string;
  readonly mailboxUrl: string | undefined;
  readonly databaseUrl: string;
  /** Resolves with a sentence when a part ends by itself. */
  readonly broken: Promise<string>;
  stop(): Promise<void>;
}
export function startStack(options: {
  settings: LaunchSettings;
  compiled?: boolean;
  say(text: string): void;
  onChild?(child: { name: string; pid: number }): void;
  signal?: AbortSignal;
}): Promise<RunningStack>;
