import { ChangeDetectionStrategy, Component } from '@angular/core';

@Component({ selector: 'sl-part-page', changeDetection: ChangeDetectionStrategy.OnPush, template: '' })
export class PartPage {}
