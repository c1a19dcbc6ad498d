import { DatePipe } from '@angular/common';
import { ChangeDetectionStrategy, Component, DOCUMENT, computed, inject, signal } from '@angular/core';
import { takeUntilDestroyed } from '@angular/core/rxjs-interop';
import { NavigationEnd, Router, RouterLink, RouterLinkActive, RouterOutlet } from '@angular/router';
import { filter } from 'rxjs';
import { Connection } from '../api/connection';
import { UnexpectedErrors } from '../errors/unexpected-errors';
import { Session } from '../session/session';
import { daysUntil, daysUntilWords } from './days-until';
import { PersonMenu } from './person-menu';
import { ProgrammeInView } from './programme-in-view';
import { type Section, organisationSections, programmeSections } from './sections';

/** The frame around every page behind sign-in: the spine with its sections, the bar with the programme, the sheet. */
@Component({
  selector: 'wl-shell',
  imports: [DatePipe, PersonMenu, RouterLink, RouterLinkActive, RouterOutlet],
  templateUrl: './shell.html',
  styleUrl: './shell.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
  host: { '(keydown.escape)': 'menuOpen.set(false)' },
})
export class Shell {
  private readonly session = inject(Session);
  private readonly document = inject(DOCUMENT);
  private readonly router = inject(Router);
  protected readonly programme = inject(ProgrammeInView).programme;
  protected readonly connection = inject(Connection);
  protected readonly unexpected = inject(UnexpectedErrors);
  protected readonly menuOpen = signal(false);

  protected readonly programmeSections = computed(() => {
    const programme = this.programme();
    return programme ? this.open(programmeSections(programme.id)) : [];
  });
  protected readonly organisationSections = computed(() => this.open(organisationSections()));

  protected readonly milestone = computed(() => {
    const next = this.programme()?.nextMilestone;
    return next && { ...next, left: daysUntilWords(daysUntil(next.date, new Date())) };
  });

  constructor() {
    this.router.events
      .pipe(
        filter((event) => event instanceof NavigationEnd),
        takeUntilDestroyed(),
      )
      .subscribe(() => this.menuOpen.set(false));
  }

  /** A plain fragment link would change the address and with it the page's state. */
  protected skip(event: Event): void {
    event.preventDefault();
    this.document.getElementById('wl-sheet')?.focus();
  }

  private open(sections: readonly Section[]): readonly Section[] {
    return sections.filter(({ needs }) => needs.some((permission) => this.session.may(permission)));
  }
}
