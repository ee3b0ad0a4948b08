import type { EditionContent, JointSide } from './edition-content.js';
import type { FieldProblem } from './problem.js';

/**
 * What an edition still lacks before it can go to the desk, in the order of the form; empty when it is complete.
 * The same list is shown in the editor and answered by the server (problem type `not-complete`).
 */
export function missingFromContent(content: EditionContent): FieldProblem[] {
  const missing: FieldProblem[] = [];
  const need = (path: string, message: string, remedy: string): void => {
    missing.push({ path, message, remedy });
  };
  if (content.title.length < 8)
    need('title', 'has fewer than 8 characters', 'Say in one line what goes wrong between which parts.');
  if (content.summary.length < 20)
    need(
      'summary',
      'has fewer than 20 characters',
      'Say in one or two sentences what helps, and for which revisions.',
    );
  if (content.joints.length === 0)
    need('joints', 'has no joint', 'Name the two parts that are meant to mate.');
  content.joints.forEach((joint, index) => {
    side(joint.a, `joints.${index}.a`);
    side(joint.b, `joints.${index}.b`);
  });
  if (content.symptoms.length === 0 && content.noticed.trim() === '') {
    need(
      'symptoms',
      'names no symptom',
      'Pick at least one from the list, or tell in your own words what you noticed.',
    );
  }
  if (content.cause.trim().length < 20)
    need('cause', 'has fewer than 20 characters', 'Say what touches what, and why.');
  content.readings.forEach((reading, index) => {
    if (reading.dimension === '')
      need(`readings.${index}.dimension`, 'is not named', 'Say which dimension was read.');
    if (reading.value === null)
      need(`readings.${index}.value`, 'has no value', 'Enter the figure, or remove the reading.');
  });
  if (content.fixes.length === 0) need('fixes', 'has no fix', 'Add at least one remedy.');
  content.fixes.forEach((fix, index) => {
    const at = `fixes.${index}`;
    if (fix.title.length < 4) need(`${at}.title`, 'has fewer than 4 characters', 'Name the remedy.');
    if (fix.kind === null)
      need(`${at}.kind`, 'is not chosen', 'Choose shim, trim, reposition, remake, swap or adjust.');
    if (fix.permanence === null)
      need(
        `${at}.permanence`,
        'is not chosen',
        'Say whether it is reversible, leaves a mark or is permanent.',
      );
    if (!fix.steps.some((step) => step.text.trim() !== ''))
      need(`${at}.steps`, 'has no step', 'Write at least one step.');
  });
  content.photos.forEach((photo, index) => {
    if (photo.alt.length < 5)
      need(
        `photos.${index}.alt`,
        'has no alternative text',
        'Say what the photo shows, for those who cannot see it.',
      );
  });
  return missing;

  function side(value: JointSide, path: string): void {
    if (value.partId === null) need(`${path}.partId`, 'is not chosen', 'Choose the part from the catalogue.');
    else if (!value.revisions.some((mark) => mark.holds)) {
      need(
        `${path}.revisions`,
        'has no revision for which it holds',
        'Mark at least one revision you know it holds for.',
      );
    }
  }
}
