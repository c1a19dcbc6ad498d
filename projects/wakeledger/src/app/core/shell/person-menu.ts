import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import { Router } from '@angular/router';
import { formatNumber } from '../numbers/format-number';
import { NUMBER_LOCALES, type NumberLocale } from '../numbers/number-locale';
import {
  DENSITIES,
  type Density,
  ENERGY_DISPLAYS,
  type EnergyDisplay,
  Preferences,
  SPEED_DISPLAYS,
  type SpeedDisplay,
  THEMES,
  type Theme,
} from '../preferences/preferences';
import { roleWords } from '../session/role-words';
import { Session } from '../session/session';

/** Who I am, where I work, how I like to read, and the way out. */
@Component({
  selector: 'wl-person-menu',
  templateUrl: './person-menu.html',
  styleUrl: './person-menu.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PersonMenu {
  private readonly session = inject(Session);
  private readonly router = inject(Router);
  protected readonly preferences = inject(Preferences);

  protected readonly member = this.session.member;
  protected readonly role = computed(() => {
    const member = this.member();
    return member ? roleWords(member.role) : '';
  });
  protected readonly others = computed(() =>
    (this.member()?.memberships ?? []).filter(
      (each) => each.organisationId !== this.member()?.organisationId,
    ),
  );
  protected readonly organisation = computed(() => this.session.membership()?.organisationName ?? '');

  protected readonly themes: readonly { readonly value: Theme; readonly words: string }[] = THEMES.map(
    (value) => ({
      value,
      words: { system: $localize`As the system`, light: $localize`Light`, dark: $localize`Dark` }[value],
    }),
  );
  protected readonly densities: readonly { readonly value: Density; readonly words: string }[] =
    DENSITIES.map((value) => ({
      value,
      words: { comfortable: $localize`Comfortable`, compact: $localize`Compact` }[value],
    }));
  protected readonly locales: readonly { readonly value: NumberLocale; readonly words: string }[] =
    NUMBER_LOCALES.map((value) => ({ value, words: formatNumber(12345.6, 1, value) }));
  protected readonly speeds = SPEED_DISPLAYS;
  protected readonly energies = ENERGY_DISPLAYS;

  protected setTheme(value: string): void {
    this.preferences.theme.set(value as Theme);
  }
  protected setDensity(value: string): void {
    this.preferences.density.set(value as Density);
  }
  protected setLocale(value: string): void {
    this.preferences.numberLocale.set(value as NumberLocale);
  }
  protected setSpeed(value: string): void {
    this.preferences.speed.set(value as SpeedDisplay);
  }
  protected setEnergy(value: string): void {
    this.preferences.energy.set(value as EnergyDisplay);
  }

  /** Leaves first, so that an unsaved page can object while it still may be saved. */
  protected async switchTo(organisationId: string): Promise<void> {
    // Going where one is already counts as not having gone.
    const there = this.router.url === '/programmes' || (await this.router.navigateByUrl('/programmes'));
    if (there) await this.session.switchTo(organisationId);
  }

  protected async signOut(): Promise<void> {
    if (!(await this.router.navigateByUrl('/sign-in?leaving=yes'))) return;
    await this.session.signOut();
    await this.router.navigateByUrl('/sign-in');
  }
}
