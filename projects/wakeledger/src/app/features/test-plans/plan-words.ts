import type { TestPlan, PlanState as SavedState } from '#shared/contracts/test-plans';
import type { PlanMachVerdict } from '#shared/core/planning/plan';
import type { QuantityFormat } from '../../ui/quantity/quantity-format';
import type { Ceiling, FlowAt, Planned } from './planned';

/** How a verdict looks beside its word: never by colour alone. */
export interface VerdictLook {
  readonly sign: string;
  readonly tone: 'moss' | 'ochre' | 'rust';
  readonly word: string;
}

const PASSES: VerdictLook = { sign: '●', tone: 'moss', word: $localize`within the limits` };
const CAUTION: VerdictLook = { sign: '▲', tone: 'ochre', word: $localize`caution` };

export const MACH_LOOKS: Readonly<Record<PlanMachVerdict, VerdictLook>> = {
  passes: PASSES,
  caution: CAUTION,
  refused: { sign: '■', tone: 'rust', word: $localize`refused` },
};

export const BLOCKAGE_LOOKS: Readonly<Record<Planned['output']['blockageVerdict'], VerdictLook>> = {
  passes: PASSES,
  caution: CAUTION,
  excluded: { sign: '■', tone: 'rust', word: $localize`refused` },
};

export const CEILING_WORDS: Readonly<Record<Ceiling, string>> = {
  mach: $localize`the limit of the Mach number`,
  facility: $localize`the facility’s highest speed`,
  balance: $localize`what the force balance carries`,
};

export const STATE_WORDS: Readonly<Record<SavedState, string>> = {
  draft: $localize`draft`,
  expected: $localize`results expected`,
  retired: $localize`retired`,
};

export function stateOf({ expectedSince, retiredAt }: TestPlan): SavedState {
  if (retiredAt !== undefined) return 'retired';
  return expectedSince === undefined ? 'draft' : 'expected';
}

/** A Reynolds number as people say it: `10.0 million`. */
export function reynoldsWords(reynolds: number, format: QuantityFormat): string {
  const digits = reynolds < 1e7 ? 2 : 1;
  return $localize`${format.value(reynolds / 1e6, 'number', { digits })}:NUMBER: million`;
}

export function machWords(mach: number, format: QuantityFormat): string {
  return format.value(mach, 'number', { digits: 2 });
}

export function speedWords(speedKmh: number, format: QuantityFormat): string {
  return format.text(speedKmh, 'speed', { digits: 0 });
}

export interface Answer {
  readonly tone: 'good' | 'attention' | 'trouble';
  readonly title: string;
  readonly sentences: readonly string[];
}

/** What the plan comes to, in sentences that anybody can read. */
export function answerOf(plan: Planned, format: QuantityFormat): Answer {
  const { needed, attainable, output, wantedReynolds, reachable } = plan;
  const wanted = reynoldsWords(wantedReynolds, format);
  const speed = speedWords(needed.speedKmh, format);
  const mach = machWords(needed.mach, format);
  const asks = $localize`A Reynolds number of ${wanted}:REYNOLDS: asks for ${speed}:SPEED: at this scale, Mach ${mach}:MACH:.`;
  if (reachable) {
    const cautions = cautionsOf(plan, needed, format);
    return cautions.length > 0
      ? { tone: 'attention', title: $localize`It can be run, with a caution`, sentences: [asks, ...cautions] }
      : { tone: 'good', title: $localize`It can be run`, sentences: [asks] };
  }
  const highest = speedWords(attainable.speedKmh, format);
  const got = reynoldsWords(attainable.reynolds, format);
  const out =
    needed.speedKmh > attainable.speedKmh
      ? [
          asks,
          ...ceilingSentences(plan, format),
          $localize`The highest speed within ${CEILING_WORDS[attainable.ceiling]}:LIMIT: is ${highest}:SPEED:, a Reynolds number of ${got}:REYNOLDS:.`,
        ]
      : [asks];
  const sentences = output.blockageVerdict === 'excluded' ? [...out, blockageSentence(plan, format)] : out;
  return { tone: 'trouble', title: $localize`It cannot be run like this`, sentences };
}

/** Why the needed speed is out of reach, for each limit that it breaks. */
function ceilingSentences({ needed, setting, inputs }: Planned, format: QuantityFormat): readonly string[] {
  const limit = machWords(setting.machLimit, format);
  const maximum = inputs.maximumSpeedKmh;
  return [
    ...(needed.machVerdict === 'refused'
      ? [
          $localize`Beyond Mach ${limit}:MACH: the air is squeezed so much that the flow is no longer that of a road vehicle: a higher speed would buy the Reynolds number with a wrong Mach number.`,
        ]
      : []),
    ...(maximum !== undefined && needed.speedKmh > maximum
      ? [$localize`The facility reaches ${speedWords(maximum, format)}:SPEED:.`]
      : []),
    ...(needed.withinBalance === false
      ? [
          $localize`The drag would be ${format.text(needed.forceN, 'force', { digits: 0 })}:FORCE:, more than the force balance carries.`,
        ]
      : []),
  ];
}

function blockageSentence({ output, setting }: Planned, format: QuantityFormat): string {
  const ratio = format.text(100 * output.blockageRatio, 'percent', { digits: 1 });
  const { blockageLimits, facility } = setting;
  const limit = facility.kind === 'open-jet' ? blockageLimits.openJetLimit : blockageLimits.blockageExcluded;
  return $localize`The model fills ${ratio}:BLOCKAGE: of the section; up to ${format.text(100 * limit, 'percent', { digits: 0 })}:LIMIT: a correction can be believed.`;
}

function cautionsOf({ output }: Planned, needed: FlowAt, format: QuantityFormat): readonly string[] {
  return [
    ...(needed.machVerdict === 'caution'
      ? [
          $localize`The Mach number is high enough that compressibility begins to show; it is still within the limit.`,
        ]
      : []),
    ...(output.blockageVerdict === 'caution'
      ? [
          $localize`The model fills ${format.text(100 * output.blockageRatio, 'percent', { digits: 1 })}:BLOCKAGE: of the section: the correction becomes a good part of the figure.`,
        ]
      : []),
    ...(needed.belowMinimumReynolds
      ? [$localize`It is below the minimum Reynolds number: the flow may turn turbulent in the wrong place.`]
      : []),
  ];
}
