import { ChangeDetectionStrategy, Component } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';
import { PageHeading } from './ui/page-focus.ts';

/** An address that names no page. */
@Component({
  selector: 'app-not-found',
  imports: [MatButton, PageHeading, RouterLink],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `<div class="page">
    <h1 appPageHeading>No such page</h1>
    <p>The address may be mistyped, or what it named is gone.</p>
    <a matButton="outlined" routerLink="/desk">Go to my desk</a>
  </div>`,
})
export class NotFound {}
