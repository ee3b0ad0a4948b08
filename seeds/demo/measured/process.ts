import type { Process } from '../../../shared/statistics/consensus.js';

const castParts = new Set(['larkfield-tube-ring-70', 'nettlecombe-riser', 'pallister-fw7']);

/** How the parts of the demo are made. */
export function processOf(part: { readonly slug: string; readonly maker: string }): Process {
  if (part.maker === 'stonebridge-prints') return 'printed';
  return castParts.has(part.slug) ? 'cast' : 'machined';
}
