export function ensureBuilt(options: {
  projectDir: string;
  logDir: string;
  say(text: string): void;
  signal?: AbortSignal;
}): Promise<void>;
