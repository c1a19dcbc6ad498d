import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import type { Check, CheckVerdict } from '#shared/core/checks/check';
import { Preferences } from '../../core/preferences/preferences';
import { QuantityFormat } from '../quantity/quantity-format';
import { checkName, checkSentence, VERDICT_INKS, VERDICT_SHAPES, VERDICT_WORDS } from './check-words';

const GRAVITY: Readonly<Record<CheckVerdict, number>> = { excluded: 0, caution: 1, passes: 2 };

/**
 * The checks of one result: what needs a person first, what passes folded away behind one line. Each has a name, a shape, a
 * word and a sentence.
 */
@Component({
  selector: 'wl-checks',
  template: `
    @if (attention().length > 0) {
      <ul>
        @for (line of attention(); track line.name) {
          <li>
            <p [class]="line.ink">
              <span aria-hidden="true" class="shape">{{ line.shape }}</span>
              <strong>{{ line.name }}</strong><span class="verdict">, {{ line.word }}</span>
            </p>
            <p class="sentence">{{ line.sentence }}</p>
          </li>
        }
      </ul>
    }
    @if (passing().length > 0) {
      <details [open]="open()">
        <summary>
          <span class="wl-moss"><span aria-hidden="true" class="shape">●</span>{{ passingWords() }}</span>
        </summary>
        <ul>
          @for (line of passing(); track line.name) {
            <li>
              <p>
                <span aria-hidden="true" class="shape wl-moss">{{ line.shape }}</span>
                <strong>{{ line.name }}</strong><span class="verdict">, {{ line.word }}</span>
              </p>
              <p class="sentence">{{ line.sentence }}</p>
            </li>
          }
        </ul>
      </details>
    }
  `,
  styleUrl: './checks.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Checks {
  readonly checks = input.required<readonly Check[]>();
  /** Show what passes at once, too. */
  readonly open = input(false);

  private readonly format = inject(QuantityFormat);
  private readonly preferences = inject(Preferences);

  private readonly lines = computed(() => {
    const language = { format: this.format, locale: this.preferences.numberLocale() };
    return [...this.checks()]
      .sort((one, other) => GRAVITY[one.verdict] - GRAVITY[other.verdict])
      .map((check) => ({
        name: checkName(check.check),
        verdict: check.verdict,
        word: VERDICT_WORDS[check.verdict],
        shape: VERDICT_SHAPES[check.verdict],
        ink: VERDICT_INKS[check.verdict],
        sentence: checkSentence(check, language),
      }));
  });
  protected readonly attention = computed(() => this.lines().filter(({ verdict }) => verdict !== 'passes'));
  protected readonly passing = computed(() => this.lines().filter(({ verdict }) => verdict === 'passes'));
  protected readonly passingWords = computed(() => {
    const count = this.passing().length;
    return count === 1 ? $localize`1 check passes` : $localize`${count}:COUNT: checks pass`;
  });
}
