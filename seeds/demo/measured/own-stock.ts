/** Stock of their own that some members keep, by account: name, thickness and standard uncertainty in mm, pieces. */
export const ownStock: Readonly<
  Record<string, readonly (readonly [string, number, number, number | null])[]>
> = {
  owner: [
    ['old token of the arcade', 1.58, 0.01, 4],
    ['brass strip from the model shop', 0.35, 0.01, null],
    ['playing card', 0.29, 0.01, 52],
    ['ring printed in nylon', 1.72, 0.03, 2],
  ],
  author: [
    ['brass sheet, half hard', 0.5, 0.006, null],
    ['ground steel washer', 1.702, 0.003, 6],
    ['transparency film', 0.1, 0.005, null],
  ],
  greta: [['copper flashing', 0.55, 0.02, null]],
  imke: [
    ['black card', 0.4, 0.015, null],
    ['razor blade', 0.1, 0.002, 8],
  ],
  vesna: [['stainless feeler strip', 0.25, 0.003, 3]],
};
