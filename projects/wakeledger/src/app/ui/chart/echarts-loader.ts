import { InjectionToken } from '@angular/core';

/** Loads the chart library when the first chart is drawn; a token, so that a test can draw without it. */
export const ECHARTS_LOADER = new InjectionToken<() => Promise<unknown>>('chart library', {
  providedIn: 'root',
  factory: () => () => import('./echarts-parts'),
});
