import {
  ChangeDetectionStrategy,
  Component,
  DOCUMENT,
  ElementRef,
  computed,
  effect,
  inject,
  input,
  signal,
  viewChild,
} from '@angular/core';
import type { EChartsCoreOption } from 'echarts/core';
import { NGX_ECHARTS_CONFIG, NgxEchartsDirective } from 'ngx-echarts';
import { chartTheme } from '../../../theme/chart-theme';
import { type ColourValues, colourValues } from '../../../theme/token-values';
import { Preferences } from '../../core/preferences/preferences';
import { fileNameOf, pngAddress, saveAddress, svgAddress } from './chart-export';
import { ECHARTS_LOADER } from './echarts-loader';

/** The figures behind a chart, for those who read rather than look. Cells are already written as text. */
export interface ChartTable {
  readonly columns: readonly string[];
  readonly rows: readonly (readonly string[])[];
}

/** What is drawn; as a function of the inks where a line or a mark needs one of its own, in light and in dark. */
export type ChartOptions = EChartsCoreOption | ((inks: ColourValues) => EChartsCoreOption);

/** A chart drawn as SVG in the product's inks, with its table behind it and export as PNG and SVG. */
@Component({
  selector: 'wl-chart',
  imports: [NgxEchartsDirective],
  templateUrl: './chart.html',
  styleUrl: './chart.scss',
  providers: [{ provide: NGX_ECHARTS_CONFIG, useFactory: () => ({ echarts: inject(ECHARTS_LOADER) }) }],
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Chart {
  /** What the chart shows, in a sentence: its caption, its description and its file name. */
  readonly caption = input.required<string>();
  readonly options = input.required<ChartOptions>();
  readonly table = input.required<ChartTable>();

  private readonly document = inject(DOCUMENT);
  private readonly preferences = inject(Preferences);
  private readonly drawing = viewChild.required('drawing', { read: ElementRef<HTMLElement> });
  private readonly systemTheme = systemTheme(this.document);
  protected readonly failed = signal(false);
  protected readonly tableShown = signal(false);

  private readonly colours = signal(colourValues(this.document.documentElement));
  protected readonly theme = computed(() => chartTheme(this.colours()));
  /** Text in tooltips is drawn, not written as HTML: the content security policy allows no inline styles. */
  protected readonly drawn = computed<EChartsCoreOption>(() => {
    const given = this.options();
    const options: EChartsCoreOption = typeof given === 'function' ? given(this.colours()) : given;
    const tooltip = options['tooltip'];
    return {
      animation: false,
      ...options,
      ...(typeof tooltip === 'object' && tooltip !== null
        ? { tooltip: { ...tooltip, renderMode: 'richText' } }
        : {}),
    };
  });
  protected readonly initialisation = { renderer: 'svg' };

  constructor() {
    effect(() => {
      this.preferences.theme();
      this.systemTheme();
      // After the root element has taken the new theme.
      queueMicrotask(() => this.colours.set(colourValues(this.document.documentElement)));
    });
  }

  protected saveSvg(): void {
    const svg = this.svg();
    if (svg) saveAddress(svgAddress(svg.text), fileNameOf(this.caption(), 'svg'), this.document);
  }

  protected async savePng(): Promise<void> {
    const svg = this.svg();
    if (!svg) return;
    try {
      const address = await pngAddress(svg.text, svg, this.colours().sheet, this.document);
      saveAddress(address, fileNameOf(this.caption(), 'png'), this.document);
      this.failed.set(false);
    } catch {
      this.failed.set(true);
    }
  }

  private svg(): { readonly text: string; readonly width: number; readonly height: number } | undefined {
    const element = this.drawing().nativeElement.querySelector('svg');
    if (!element) return undefined;
    const { width, height } = element.getBoundingClientRect();
    const text = new XMLSerializer().serializeToString(element);
    return { text, width: Math.round(width), height: Math.round(height) };
  }
}

/** Whether the system wants dark, as a signal; false where the browser cannot say. */
function systemTheme(document: Document): () => boolean {
  const query = document.defaultView?.matchMedia?.('(prefers-color-scheme: dark)');
  const dark = signal(query?.matches ?? false);
  query?.addEventListener('change', (event) => dark.set(event.matches));
  return dark;
}
