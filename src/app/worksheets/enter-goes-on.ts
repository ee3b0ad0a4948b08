import { Directive } from '@angular/core';

/**
 * Enter goes to the next field instead of sending: calipers with a data cable end each reading with it, and so does the
 * thumb on a phone.
 */
@Directive({
  selector: 'form[slEnterGoesOn]',
  host: { '(keydown.enter)': 'goOn($event)', '(submit)': 'stay($event)' },
})
export class EnterGoesOn {
  protected goOn(event: Event): void {
    const from = event.target;
    if (!(from instanceof HTMLInputElement) || !from.form) return;
    event.preventDefault();
    const fields = [...from.form.querySelectorAll<HTMLInputElement>('input[inputmode]:not([data-beside])')];
    const at = fields.findIndex((field) => (field.compareDocumentPosition(from) & 4) === 0 && field !== from);
    const next = fields[at];
    next?.focus();
    next?.select();
  }

  protected stay(event: Event): void {
    event.preventDefault();
  }
}
