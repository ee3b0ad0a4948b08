import type { LaunchSettings } from './stack.mjs';
export function readLaunchSettings(
  environment: Record<string, string | undefined>,
  options?: { compiled?: boolean },
): LaunchSettings;
