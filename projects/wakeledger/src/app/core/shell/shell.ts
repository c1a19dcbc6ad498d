import { DatePipe } from '@angular/common';
import {
  ChangeDetectionStrategy,
  Component,
  DOCUMENT,
  type ElementRef,
  Injector,
  afterNextRender,
  computed,
  inject,
  signal,
  viewChild,
} from '@angular/core';
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
  host: { '(keydown.escape)': 'closeMenu()' },
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

  private readonly opener = viewChild.required<ElementRef<HTMLElement>>('opener');
  private readonly closer = viewChild.required<ElementRef<HTMLElement>>('closer');
  private readonly injector = inject(Injector);

  constructor() {
    this.router.events
      .pipe(
        filter((event) => event instanceof NavigationEnd),
        takeUntilDestroyed(),
      )
      .subscribe(() => this.menuOpen.set(false));
  }

  /** The spine on a narrow screen; the focus goes along, and comes back when it is closed. */
  protected openMenu(): void {
    this.menuOpen.set(true);
    afterNextRender(() => this.closer().nativeElement.focus(), { injector: this.injector });
  }

  protected closeMenu(): void {
    if (!this.menuOpen()) return;
    this.menuOpen.set(false);
    this.opener().nativeElement.focus();
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
