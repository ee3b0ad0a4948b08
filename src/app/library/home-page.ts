import { ChangeDetectionStrategy, Component } from '@angular/core';

@Component({ selector: 'sl-home-page', changeDetection: ChangeDetectionStrategy.OnPush, template: '' })
export class HomePage {}
