import { ChangeDetectionStrategy, Component } from '@angular/core';

@Component({ selector: 'sl-search-page', changeDetection: ChangeDetectionStrategy.OnPush, template: '' })
export class SearchPage {}
