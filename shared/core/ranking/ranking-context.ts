import type { RoadLoadReference } from '../road-load/road-load';
import type { EvidenceRule } from './ranking-input';

/** Which area the programme shows coefficients on. */
export type CommonAreaPolicy =
  | { readonly kind: 'fixed'; readonly areaM2: number }
  | { readonly kind: 'variant'; readonly variantId: string };

/** One way in which a variant is sold, as far as its energy at the wheel depends on it. */
export interface ContextConfiguration {
  readonly id: string;
  readonly name: string;
  readonly massKg: number;
  readonly rollingResistance?: number | undefined;
  readonly roadLoadReference?: RoadLoadReference | undefined;
  readonly salesShare: number;
}

/** What a person sees of a variant beside its figures. */
export interface ContextVariant {
  readonly id: string;
  readonly name: string;
  readonly bodyShape: string;
  readonly description?: string | undefined;
  readonly lengthMm?: number | undefined;
  readonly widthMm?: number | undefined;
  readonly heightMm?: number | undefined;
  readonly wheelbaseMm?: number | undefined;
  readonly frontalAreaMethod: string;
  readonly frontalAreaDate: string;
  /** The first is the base; none where nobody has typed a mass yet. */
  readonly configurations: readonly ContextConfiguration[];
}

/** What a variant rests on; a result of it that was withdrawn since is not named. */
export interface ContextAdoption {
  readonly id: string;
  readonly variantId: string;
  /** At least one. */
  readonly resultIds: readonly string[];
  readonly rule: EvidenceRule;
  /** When and by whom; a moment with its offset. */
  readonly at: string;
  readonly by: string;
}

/** A reason that somebody wrote down for a result: why it counts though it is not comparable, or why it does not. */
export interface ContextReason {
  readonly resultId: string;
  readonly reason: string;
  readonly at: string;
  readonly by: string;
}

/** A version of a correlation that is in use; `since` is a date. */
export interface ContextCorrelation {
  readonly id: string;
  readonly name: string;
  readonly number: number;
  readonly since: string;
  readonly by: string;
}

export interface ContextCycle {
  readonly key: string;
  readonly name: string;
  readonly source: string;
  readonly timeS: readonly number[];
  readonly speedKmh: readonly number[];
}

/** What the ranking screen needs beside the inputs of the method. Only variants that are not retired, and adoptions that stand. */
export interface RankingContext {
  readonly programme: {
    readonly id: string;
    readonly name: string;
    readonly commonArea: CommonAreaPolicy;
    readonly characteristicLengthName: string;
    readonly milestones: readonly { readonly id: string; readonly name: string; readonly date: string }[];
  };
  readonly variants: readonly ContextVariant[];
  readonly adoptions: readonly ContextAdoption[];
  /** Results that are kept out of every evidence by judgement. */
  readonly setAside: readonly ContextReason[];
  /** Results that are not comparable and count with a written reason. */
  readonly included: readonly ContextReason[];
  /** Number of the organisation's policies in force; null where nobody has changed them yet. */
  readonly policyNumber: number | null;
  /** Entries in facilities, by the id that the inputs hold. */
  readonly sessions: readonly { readonly id: string; readonly name: string }[];
  /** Which version of each facility's corrections and uncertainties the inputs hold. */
  readonly facilityVersions: readonly { readonly facilityId: string; readonly number: number }[];
  /** Which versions of correlations the inputs hold, by the version's id, and since when and by whom they are used. */
  readonly correlations: readonly ContextCorrelation[];
  readonly cycles: readonly ContextCycle[];
}
