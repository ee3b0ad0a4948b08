import { ChangeDetectionStrategy, Component } from '@angular/core';

@Component({ selector: 'sl-hardware-page', changeDetection: ChangeDetectionStrategy.OnPush, template: '' })
export class HardwarePage {}
