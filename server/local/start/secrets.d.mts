export function readSecrets(
  dataDir: string,
): Record<'database' | 'databaseRoot' | 'search' | 'bounce' | 'session', string>;
