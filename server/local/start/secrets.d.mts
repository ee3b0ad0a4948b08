export function readSecrets(
  dataDir: string,
): Record<'database' | 'databaseRoot' | 'search' | 'session', string>;
