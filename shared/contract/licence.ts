/** The licence under which everything published here may be used by others. */
export const licence = {
  /** Identifier in the SPDX licence list. */
  spdx: 'CC-BY-SA-4.0',
  shortName: 'CC BY-SA 4.0',
  name: 'Creative Commons Attribution-ShareAlike 4.0 International',
  url: 'https://creativecommons.org/licenses/by-sa/4.0/',
} as const;

/** Name under which the published work of somebody who has left goes on. */
export const formerMember = 'a former member';
