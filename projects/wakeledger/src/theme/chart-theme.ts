import type { ColourValues } from './token-values';

const TEXT = "'Source Sans 3 Variable', sans-serif";

/** The order in which several traces take their inks: those furthest apart first. */
export function seriesInks(colours: ColourValues): string[] {
  return [colours.petrol, colours.ochre, colours.plum, colours.moss, colours.rust, colours.edge];
}

/** The charts' theme, built from the tokens: few gridlines, axis lines that can be seen, no shadows. */
export function chartTheme(colours: ColourValues): Record<string, unknown> {
  const axis = {
    axisLine: { show: true, lineStyle: { color: colours.edge } },
    axisTick: { show: true, lineStyle: { color: colours.edge } },
    axisLabel: { color: colours.ink, fontFamily: TEXT, fontSize: 12 },
    nameTextStyle: { color: colours.ink, fontFamily: TEXT, fontSize: 12 },
    splitLine: { show: true, lineStyle: { color: colours.rule, width: 1 } },
    splitArea: { show: false },
  };
  return {
    color: seriesInks(colours),
    backgroundColor: 'transparent',
    textStyle: { color: colours.ink, fontFamily: TEXT },
    line: { symbol: 'none', lineStyle: { width: 1.5 }, smooth: false },
    // Names at lines and points: in ink, readable across what they lie on.
    scatter: {
      label: {
        color: colours.ink,
        fontFamily: TEXT,
        fontSize: 12,
        textBorderWidth: 0,
        // Else a name is as faint as its point.
        opacity: 1,
        backgroundColor: colours.paper,
        padding: [0, 2],
      },
    },
    categoryAxis: { ...axis, splitLine: { show: false } },
    valueAxis: axis,
    timeAxis: axis,
    logAxis: axis,
    legend: { textStyle: { color: colours.ink, fontFamily: TEXT } },
    tooltip: {
      backgroundColor: colours.sheet,
      borderColor: colours.edge,
      borderWidth: 1,
      textStyle: { color: colours.ink, fontFamily: TEXT, fontSize: 12 },
      axisPointer: { lineStyle: { color: colours.edge }, crossStyle: { color: colours.edge } },
    },
  };
}
