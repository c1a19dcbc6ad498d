import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { QuantityFormat } from '../../ui/quantity/quantity-format';
import {
  BLOCKAGE_LOOKS,
  CEILING_WORDS,
  MACH_LOOKS,
  machWords,
  reynoldsWords,
  speedWords,
  type VerdictLook,
} from './plan-words';
import type { FlowAt, Planned } from './planned';

interface FigureRow {
  readonly label: string;
  readonly cells: readonly { readonly text: string; readonly look?: VerdictLook | undefined }[];
}

/** Speed, Mach and Reynolds number, dynamic pressure and force: as needed, as attainable, and as settled on. */
@Component({
  selector: 'wl-plan-figures',
  template: `
    <div class="wl-scroll" tabindex="0" role="region" aria-label="The figures of this plan" i18n-aria-label>
      <table class="wl-table">
        <thead>
          <tr>
            <th scope="col"><span class="wl-heard" i18n>Figure</span></th>
            @for (column of columns(); track $index) {
              <th scope="col" class="wl-figure">{{ column.head }}</th>
            }
          </tr>
        </thead>
        <tbody>
          @for (row of rows(); track row.label) {
            <tr>
              <th scope="row">{{ row.label }}</th>
              @for (cell of row.cells; track $index) {
                <td class="wl-figure">
                  {{ cell.text }}
                  @if (cell.look; as look) {
                    <span class="look wl-{{ look.tone }}"
                      ><span aria-hidden="true">{{ look.sign }} </span>{{ look.word }}</span
                    >
                  }
                </td>
              }
            </tr>
          }
        </tbody>
      </table>
    </div>
    <p class="blockage">
      <ng-container i18n
        >Blockage {{ blockage().ratio }} of the section’s {{ blockage().section }}:</ng-container
      >
      &ngsp;<span class="wl-{{ blockage().look.tone }}"
        ><span aria-hidden="true">{{ blockage().look.sign }} </span>{{ blockage().look.word }}</span
      >
    </p>
  `,
  styles: `
    :host {
      display: block;
      min-width: 0;
    }
    thead .wl-figure {
      max-width: 11em;
      white-space: normal;
    }
    .look {
      display: block;
      font-size: var(--wl-small);
    }
    .blockage {
      margin: 8px 0 0;
    }
    tbody th {
      font-weight: 500;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PlanFigures {
  readonly plan = input.required<Planned>();

  private readonly format = inject(QuantityFormat);

  protected readonly columns = computed((): readonly { readonly head: string; readonly flow: FlowAt }[] => {
    const { needed, attainable, settled } = this.plan();
    return [
      { head: $localize`needed`, flow: needed },
      {
        head: $localize`highest allowed: ${CEILING_WORDS[attainable.ceiling]}:LIMIT:`,
        flow: attainable,
      },
      ...(settled ? [{ head: $localize`settled on`, flow: settled }] : []),
    ];
  });

  protected readonly rows = computed((): readonly FigureRow[] => {
    const flows = this.columns().map(({ flow }) => flow);
    const { format } = this;
    const row = (label: string, cell: (flow: FlowAt) => FigureRow['cells'][number]): FigureRow => ({
      label,
      cells: flows.map(cell),
    });
    return [
      row($localize`Speed`, ({ speedKmh }) => ({ text: speedWords(speedKmh, format) })),
      row($localize`Mach number`, ({ mach, machVerdict }) => ({
        text: machWords(mach, format),
        look: MACH_LOOKS[machVerdict],
      })),
      row($localize`Reynolds number`, ({ reynolds, belowMinimumReynolds }) => ({
        text: reynoldsWords(reynolds, format),
        look: belowMinimumReynolds
          ? { sign: '▲', tone: 'ochre', word: $localize`below the minimum` }
          : undefined,
      })),
      row($localize`Share of what is wanted`, ({ reynolds }) => ({
        text: format.text((100 * reynolds) / this.plan().wantedReynolds, 'percent', { digits: 0 }),
      })),
      row($localize`Dynamic pressure`, ({ dynamicPressurePa }) => ({
        text: format.text(dynamicPressurePa, 'pressure', { digits: 0 }),
      })),
      row($localize`Expected drag force`, ({ forceN, withinBalance }) => ({
        text: format.text(forceN, 'force', { digits: 0 }),
        look:
          withinBalance === false
            ? { sign: '■', tone: 'rust', word: $localize`more than the balance carries` }
            : undefined,
      })),
    ];
  });

  protected readonly blockage = computed(() => {
    const { output, setting } = this.plan();
    return {
      ratio: this.format.text(100 * output.blockageRatio, 'percent', { digits: 1 }),
      section: this.format.text(setting.facility.areaM2, 'area', { digits: 2 }),
      look: BLOCKAGE_LOOKS[output.blockageVerdict],
    };
  });
}
