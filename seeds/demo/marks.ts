/** What can be seen on a part without measuring, and the letters of the revisions that show it; the others do not. */
export const demoMarks: Readonly<Record<string, readonly { text: string; on: string }[]>> = {
  'tarn-m1': [
    { text: 'a blue stripe on the label', on: 'AB' },
    { text: 'a letter on the label', on: 'BCD' },
    { text: 'the plug at the side, not at the rear', on: 'BCD' },
    { text: 'a flat on the shaft', on: 'D' },
  ],
  'tarn-m2': [
    { text: 'a letter on the label', on: 'BC' },
    { text: 'an angled plug on the cable', on: 'C' },
  ],
  'stonebridge-belt-bracket': [
    { text: 'one or two dots underneath', on: 'AB' },
    { text: 'ribs along the arm', on: 'CD' },
    { text: 'an even number of dots underneath', on: 'BD' },
  ],
  'cotterpin-ring-gear-kit': [
    { text: 'a white ring', on: 'A' },
    { text: 'a clamp screw whose head stands proud', on: 'B' },
    { text: 'a letter C on the ring', on: 'C' },
    { text: 'a notch in the ring', on: 'D' },
  ],
  'oxbow-ring-clamp': [
    { text: 'nylon pads inside', on: 'BC' },
    { text: 'three pads', on: 'C' },
  ],
  'oxbow-dovetail-clamp': [
    { text: 'two knobs', on: 'BC' },
    { text: 'a jaw that swivels', on: 'C' },
  ],
  'stonebridge-guide-foot': [
    { text: 'a matt surface', on: 'BC' },
    { text: 'brass inserts', on: 'C' },
  ],
  'quillback-q16': [
    { text: 'a black body', on: 'C' },
    { text: 'tilt screws in the flange', on: 'B' },
  ],
  'pallister-fw5': [
    { text: 'filters held by spring wire', on: 'A' },
    { text: 'filters held by threaded rings', on: 'C' },
  ],
  'brackwater-r54': [
    { text: 'a toothed inner ring', on: 'C' },
    { text: 'a spring screw that can be reached from outside', on: 'B' },
  ],
  'emberfell-strip-60': [
    { text: 'the cable at the end', on: 'A' },
    { text: 'a buckle instead of tape', on: 'C' },
  ],
  'emberfell-dew-ring': [
    { text: 'a lining of cork', on: 'C' },
    { text: 'four nylon screws', on: 'B' },
  ],
};
