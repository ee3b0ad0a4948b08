/** What Tarn Motion says on write-ups about its parts, by their slug; earlier texts first. */
export const makerAnswers: Readonly<
  Record<string, readonly { readonly daysAgo: number; readonly text: string }[]>
> = {
  'm1-rigid-bracket-rocks-on-the-wren-60-tube': [
    {
      daysAgo: 560,
      text: 'Thank you for the feeler-leaf readings. The first saddle was cut for the 70 mm tube ring and should never have been sold for the bare tube. We look into it.',
    },
    {
      daysAgo: 430,
      text: 'Brackets from **Rev B** on are cut for 66 mm and lined with cork. Whoever has a Rev A can send it in: we line it at the cost of the postage. The cork strips told here do the same; 0.6 mm is what ours come out at too.',
    },
  ],
  'm2-screws-do-not-line-up-with-the-motor-plate': [
    {
      daysAgo: 40,
      text: 'The circle of 33 mm came with the stronger gearbox of Rev B. **Rev D**, which we have announced, has eight holes: four on 31 mm and four on 33 mm, so it meets plates of either kind without a file.',
    },
  ],
  'pinion-slips-on-the-m1-shaft': [
    {
      daysAgo: 110,
      text: 'Rev D has a flat of 0.5 mm, which is what the screw wants. On a Rev A to C please do not file the shaft in the motor: we exchange the shaft for one with a flat, and the gearbox stays clean.',
    },
  ],
  'm1-cable-outlet-hits-the-tube-ring': [
    {
      daysAgo: 300,
      text: 'Turning the motor by a quarter is fine: its face holes are square and nothing inside minds. Mind the loop of the cable, not the plug.',
    },
  ],
};

/** A revision that Tarn Motion has announced and does not sell yet. */
export const announcedRevision = {
  part: 'tarn-m2',
  label: 'Rev D',
  announcedDaysAgo: 45,
  soldInDays: 75,
  whatChanges:
    'Eight face holes, four on Ø 31 and four on Ø 33. Recess and shaft are meant to stay as they are on Rev C.',
  howToTell: 'Letter D and eight holes in the face instead of four.',
} as const;
