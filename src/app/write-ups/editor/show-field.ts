import { fieldId } from './field-names';

/**
 * Brings the field at a path into view, unfolds the section around it and puts the focus there. Where the field itself
 * is not drawn (a list that is empty), the nearest thing above it on the path is shown.
 */
export function showField(document: Document, path: string): void {
  const steps = path.split('.');
  while (steps.length > 0) {
    const element = document.getElementById(fieldId(steps.join('.')));
    if (element) {
      for (
        let around = element.closest('details');
        around;
        around = around.parentElement?.closest('details') ?? null
      )
        around.open = true;
      element.scrollIntoView({ block: 'center' });
      element.focus({ preventScroll: true });
      return;
    }
    steps.pop();
  }
}
