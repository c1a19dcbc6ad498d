import type { ChartPoint, ControlChart, DriftSign } from '#shared/core/uncertainty/control-chart';

/** The signs of drift, each as what this session is. */
export const DRIFT_WORDS: Readonly<Record<DriftSign, string>> = {
  'beyond-action-limit': $localize`beyond the action limit`,
  'two-of-three-beyond-warning-limit': $localize`the second of three sessions beyond the same warning limit`,
  'seven-on-one-side': $localize`the seventh session in a row on one side of the centre line`,
  'seven-rising': $localize`the seventh session in a row that rises`,
  'seven-falling': $localize`the seventh session in a row that falls`,
};

/** How a session is marked: a shape, a word and an ink, never a colour alone. */
export interface PointMark {
  readonly shape: string;
  readonly words: string;
  readonly ink: '' | 'wl-ochre' | 'wl-rust' | 'wl-moss';
}

export function markOf({ limits }: Pick<ChartPoint, 'limits'>): PointMark {
  if (limits === undefined) return { shape: '○', words: $localize`no limits yet`, ink: '' };
  if (limits.signs.length > 0) {
    return { shape: '◆', words: limits.signs.map((sign) => DRIFT_WORDS[sign]).join('; '), ink: 'wl-rust' };
  }
  if (limits.place === 'beyond-warning') {
    return { shape: '▲', words: $localize`beyond the warning limit`, ink: 'wl-ochre' };
  }
  return { shape: '●', words: $localize`within the limits`, ink: 'wl-moss' };
}

export interface ChartVerdict {
  readonly kind: 'too-few' | 'steady' | 'warning' | 'drift';
  readonly title: string;
  readonly lines: readonly string[];
}

/** What the whole chart says, in a sentence, with a line for each session that stands out. */
export function verdictOf(chart: ControlChart, nameOf: (sessionId: string) => string): ChartVerdict {
  const count = chart.points.length;
  if (chart.scatter === undefined) {
    return {
      kind: 'too-few',
      title: $localize`Limits need three sessions; there are ${chart.settingSessions}:COUNT:.`,
      lines: [],
    };
  }
  const marked = chart.points.map((point) => ({ point, mark: markOf(point) }));
  const lineOf = ({ point, mark }: (typeof marked)[number]): string =>
    $localize`${nameOf(point.sessionId)}:SESSION: is ${mark.words}:SIGN:.`;
  const drifting = marked.filter(({ point }) => (point.limits?.signs.length ?? 0) > 0);
  if (drifting.length > 0) {
    return {
      kind: 'drift',
      title: $localize`The facility has moved against its check body, or what was measured is not the same body any more.`,
      lines: drifting.map(lineOf),
    };
  }
  const warned = marked.filter(({ point }) => point.limits?.place === 'beyond-warning');
  if (warned.length > 0) {
    return {
      kind: 'warning',
      title: $localize`One such session in twenty is chance. Measure again before the next results are trusted.`,
      lines: warned.map(lineOf),
    };
  }
  return {
    kind: 'steady',
    title: $localize`No sign of drift in ${count}:COUNT: sessions.`,
    lines: [],
  };
}
