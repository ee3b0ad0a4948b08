export function claimDataFolder(
  dataDir: string,
  address: string,
  say: (text: string) => void,
): Promise<{ noteChild(child: { name: string; pid: number }): void; release(): void }>;
