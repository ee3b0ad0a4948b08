export function fingerprint(root: string, paths: readonly string[]): string;
