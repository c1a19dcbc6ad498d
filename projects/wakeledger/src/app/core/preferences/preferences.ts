import { DOCUMENT, Injectable, effect, inject, signal } from '@angular/core';
import { type NumberLocale, NUMBER_LOCALES } from '../numbers/number-locale';

export const THEMES = ['system', 'light', 'dark'] as const;
export type Theme = (typeof THEMES)[number];
export const DENSITIES = ['comfortable', 'compact'] as const;
export type Density = (typeof DENSITIES)[number];
export const SPEED_DISPLAYS = ['km/h', 'mph'] as const;
export type SpeedDisplay = (typeof SPEED_DISPLAYS)[number];
export const ENERGY_DISPLAYS = ['Wh/km', 'kWh/100 km', 'Wh/mi'] as const;
export type EnergyDisplay = (typeof ENERGY_DISPLAYS)[number];

const KEY = 'wakeledger.preferences';

interface Stored {
  readonly theme: Theme;
  readonly density: Density;
  readonly numberLocale: NumberLocale;
  readonly speed: SpeedDisplay;
  readonly energy: EnergyDisplay;
}

/** How this person, in this browser, wants to read: kept here and nowhere else. */
@Injectable({ providedIn: 'root' })
export class Preferences {
  private readonly document = inject(DOCUMENT);
  private readonly stored = readStored(this.document);

  readonly theme = signal<Theme>(oneOf(THEMES, this.stored['theme']));
  readonly density = signal<Density>(oneOf(DENSITIES, this.stored['density']));
  /** How numbers are written; apart from the language of the texts. */
  readonly numberLocale = signal<NumberLocale>(oneOf(NUMBER_LOCALES, this.stored['numberLocale']));
  readonly speed = signal<SpeedDisplay>(oneOf(SPEED_DISPLAYS, this.stored['speed']));
  readonly energy = signal<EnergyDisplay>(oneOf(ENERGY_DISPLAYS, this.stored['energy']));

  constructor() {
    const root = this.document.documentElement;
    effect(() => {
      const theme = this.theme();
      if (theme === 'system') delete root.dataset['theme'];
      else root.dataset['theme'] = theme;
      root.dataset['density'] = this.density();
    });
    effect(() => {
      const stored: Stored = {
        theme: this.theme(),
        density: this.density(),
        numberLocale: this.numberLocale(),
        speed: this.speed(),
        energy: this.energy(),
      };
      try {
        this.document.defaultView?.localStorage.setItem(KEY, JSON.stringify(stored));
      } catch {
        // A browser that keeps nothing still shows everything.
      }
    });
  }
}

function readStored(document: Document): Readonly<Record<string, unknown>> {
  try {
    const value: unknown = JSON.parse(document.defaultView?.localStorage.getItem(KEY) ?? '{}');
    return typeof value === 'object' && value !== null ? (value as Record<string, unknown>) : {};
  } catch {
    return {};
  }
}

/** The stored value where it is one of the choices, else the first choice. */
function oneOf<const T extends readonly [string, ...string[]]>(choices: T, stored: unknown): T[number] {
  return choices.find((choice) => choice === stored) ?? choices[0];
}
