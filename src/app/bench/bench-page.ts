import { ChangeDetectionStrategy, Component } from '@angular/core';

@Component({ selector: 'sl-bench-page', changeDetection: ChangeDetectionStrategy.OnPush, template: '' })
export class BenchPage {}
