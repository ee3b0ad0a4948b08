import type { Acceptance, EditionContent, Fix, JointSide, Reading } from '../contract/edition-content.js';
import {
  afterwardsWords,
  fixKindWords,
  instrumentWords,
  permanenceWords,
  readingUnitSymbols,
  type ReadingUnit,
} from '../contract/vocabulary.js';
import type { WorksheetRecord } from '../contract/worksheet.js';
import { calloutPlace, calloutWords } from './callout-words.js';

/** What things are called that a content only points at. */
export interface ContentNames {
  part(id: number): string;
  /** With its part: "M1 Rev C". */
  revision(id: number): string;
  symptom(slug: string): string;
  /** Its alternative text. */
  photo(id: number): string;
}

/** One thing an edition says, as text. `field` stays the same for the same thing across editions. */
export interface EditionField {
  readonly field: string;
  readonly label: string;
  readonly text: string;
}

/** Everything an edition says, in the order of its page; what is empty is there with an empty text. */
export function fieldsOf(content: EditionContent, names: ContentNames): EditionField[] {
  return [
    { field: 'title', label: 'Title', text: content.title },
    { field: 'summary', label: 'Summary', text: content.summary },
    ...content.joints.flatMap((joint, index) => [
      { field: `joints.${index}.a`, label: `Joint ${index + 1}, first side`, text: sideText(joint.a, names) },
      {
        field: `joints.${index}.b`,
        label: `Joint ${index + 1}, second side`,
        text: sideText(joint.b, names),
      },
    ]),
    {
      field: 'symptoms',
      label: 'Symptoms',
      text: content.symptoms.map((slug) => names.symptom(slug)).join('\n'),
    },
    { field: 'noticed', label: 'What is noticed', text: content.noticed },
    { field: 'cause', label: 'Cause', text: content.cause },
    ...content.readings.map((reading) => ({
      field: `readings.${reading.key}`,
      label: `Reading “${reading.dimension}”`,
      text: readingText(reading, names),
    })),
    ...content.fixes.flatMap((fix) => fixFields(fix, names)),
    ...photoFields(content),
    { field: 'sources', label: 'Sources', text: content.sources },
  ];
}

function fixFields(fix: Fix, names: ContentNames): EditionField[] {
  const of = (name: string, label: string, text: string): EditionField => ({
    field: `fixes.${fix.key}.${name}`,
    label: `Fix “${fix.title}”, ${label}`,
    text,
  });
  const afterwards = fix.afterwards.map((thing) => afterwardsWords[thing]);
  return [
    of('title', 'title', fix.title),
    of('kind', 'kind', fix.kind ? fixKindWords[fix.kind].label : ''),
    of('permanence', 'permanence', fix.permanence ? permanenceWords[fix.permanence] : ''),
    of('why', 'why', fix.why),
    of('tools', 'tools', fix.tools.join('\n')),
    of('materials', 'materials', fix.materials.join('\n')),
    ...fix.steps.map((step, index) =>
      of(
        `steps.${step.key}`,
        `step ${index + 1}`,
        step.photoId === null ? step.text : `${step.text}\n\nPhoto: ${names.photo(step.photoId)}`,
      ),
    ),
    of('revisions', 'revisions', fix.revisionIds.map((id) => names.revision(id)).join('\n')),
    of(
      'afterwards',
      'afterwards',
      [...afterwards, fix.afterwardsNote].filter((line) => line !== '').join('\n'),
    ),
    of('acceptance', 'acceptance figure', fix.acceptance ? acceptanceText(fix.acceptance) : ''),
    of('worksheet', 'worksheet', fix.worksheet ? worksheetText(fix.worksheet) : ''),
  ];
}

/** A photo that is shown twice counts as two. Editions from before callouts lack the field. */
function photoFields(content: EditionContent): EditionField[] {
  const seen = new Map<number, number>();
  return content.photos.map(({ photoId, alt, caption, callouts = [] }) => {
    const times = (seen.get(photoId) ?? 0) + 1;
    seen.set(photoId, times);
    return {
      field: times === 1 ? `photos.${photoId}` : `photos.${photoId}.${times}`,
      label: `Photo “${alt}”`,
      text: [alt, caption, ...callouts.map((one) => `${calloutWords(one)}, ${calloutPlace(one)}`)]
        .filter((line) => line !== '')
        .join('\n'),
    };
  });
}

function sideText(side: JointSide, names: ContentNames): string {
  if (side.partId === null) return side.feature;
  const part = side.feature === '' ? names.part(side.partId) : `${names.part(side.partId)}: ${side.feature}`;
  const marks = side.revisions.map(
    (mark) => `${mark.holds ? 'holds for' : 'not for'} ${names.revision(mark.revisionId)}`,
  );
  return [part, ...marks].join('\n');
}

function readingText(reading: Reading, names: ContentNames): string {
  const value = reading.value === null ? 'no value' : withUnit(reading.value, reading.unit);
  const uncertainty =
    reading.uncertainty === null ? '' : `, uncertainty ${withUnit(reading.uncertainty, reading.unit)}`;
  const revision = reading.revisionId === null ? '' : `, ${names.revision(reading.revisionId)}`;
  return `${reading.dimension}: ${value}${uncertainty}, ${instrumentWords[reading.instrument]}${revision}`;
}

function acceptanceText({ quantity, comparison, value, unit }: Acceptance): string {
  return `${quantity} ${comparison === 'at-most' ? 'at most' : 'at least'} ${withUnit(value, unit)}`;
}

function worksheetText({ kind, inputs, result }: WorksheetRecord): string {
  const typed = Object.entries(inputs).filter(
    ([, value]) => typeof value === 'number' || typeof value === 'string',
  );
  const figures = typed
    .filter(([, value]) => value !== '')
    .map(([name, value]) => `${name} ${String(value)}`);
  return [`${kind}: ${result.sentence}`, ...figures].join('\n');
}

function withUnit(value: number, unit: ReadingUnit): string {
  return `${value} ${readingUnitSymbols[unit]}`;
}
