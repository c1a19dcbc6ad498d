import { policiesInputOf, type CheckLimits } from '#shared/core/checks/limits';
import { judgedResult, type ResultJudgement } from '#shared/core/ranking/judged-result';
import type { AreaChoice } from '#shared/core/ranking/ranking-choices';
import type { CommonAreaPolicy, RankingContext } from '#shared/core/ranking/ranking-context';
import type {
  AdjustmentInput,
  FacilityInput,
  PointInput,
  RankingInput,
  ResultInput,
  VariantInput,
} from '#shared/core/ranking/ranking-input';
import {
  consideredResults,
  ruledVariants,
  type ConsideredEvidence,
} from '#shared/core/ranking/ranking-view-input';
import type { CorrelationInUse } from '../correlations';
import { withSweeps } from '#shared/core/ranking/sweeps';
import { decisionsOf } from './ranking-decisions';
import type {
  AdoptionRow,
  AreaRow,
  ConfigurationRow,
  FacilityRow,
  JudgementRow,
  PointRow,
  ProgrammeRow,
  ResultRow,
  VariantRow,
} from './rankings.repository';

/** Rows of one programme, as they lie in the database: what both the inputs and what stands beside them need. */
export interface ProgrammeRows {
  readonly programme: ProgrammeRow;
  readonly variants: readonly VariantRow[];
  readonly areas: readonly AreaRow[];
  readonly configurations: readonly ConfigurationRow[];
  readonly results: readonly ResultRow[];
  readonly adoptions: readonly AdoptionRow[];
  readonly judgements: readonly JudgementRow[];
  readonly facilityVersions: RankingContext['facilityVersions'];
  /** The organisation's limits in force. */
  readonly policies: { readonly number: number; readonly values: CheckLimits };
  readonly adjustments: readonly AdjustmentInput[];
  /** To the programme's reference facility, as they are used today. */
  readonly correlations: readonly CorrelationInUse[];
}

/** And what only the inputs of the method need. */
export interface RankingRows extends ProgrammeRows {
  readonly facilities: readonly FacilityRow[];
  readonly points: readonly PointRow[];
}

type Present<T> = { [K in keyof T]?: Exclude<T[K], null> };

/** The fields that hold something: what is absent in the database is absent in the answer. */
function present<T extends object>(fields: T): Present<T> {
  return Object.fromEntries(
    Object.entries(fields).filter(([, value]) => value !== null && value !== undefined),
  ) as Present<T>;
}

function grouped<T>(rows: readonly T[], keyOf: (row: T) => string): ReadonlyMap<string, readonly T[]> {
  const groups = new Map<string, T[]>();
  for (const row of rows) {
    const group = groups.get(keyOf(row));
    if (group) group.push(row);
    else groups.set(keyOf(row), [row]);
  }
  return groups;
}

function pointInput(row: PointRow): PointInput {
  const { yawDeg, value, s, n, speedKmh, dynamicPressurePa, tareN, frontLift, rearLift, sideForce } = row;
  return {
    yawDeg,
    value,
    ...present({ s, n, speedKmh, dynamicPressurePa, tareN, frontLift, rearLift, sideForce }),
  };
}

/** Installations are known by a name within their facility. */
const installationId = (row: ResultRow): string | null =>
  row.installation === null ? null : `${row.facilityId}:${row.installation}`;

function resultInput(row: ResultRow, points: readonly PointRow[]): ResultInput {
  const { id, name, variantId, facilityId, testDate, entrySequence, quantity, scale, condition } = row;
  const { quotedAreaM2, quotedAreaUM2, quotedAreaScale, speedKmh, dynamicPressurePa, air } = row;
  const { tareAlreadySubtracted, tareN, blockageAlreadyCorrectedBy, stated, modelId } = row;
  return {
    id,
    name,
    variantId,
    facilityId,
    testDate,
    entrySequence,
    quantity,
    scale,
    condition,
    points: points.map(pointInput),
    ...present({
      sessionId: row.testSessionId,
      installationId: installationId(row),
      modelId,
      quotedAreaM2,
      quotedAreaUM2,
      quotedAreaScale,
      speedKmh,
      dynamicPressurePa,
      air,
      tareAlreadySubtracted,
      tareN,
      blockageAlreadyCorrectedBy,
      turbulenceGenerationOrTrips: row.turbulenceOrTrips,
      stated,
    }),
  };
}

function judgementInput(row: JudgementRow | undefined): ResultJudgement | undefined {
  return row && { reynolds: row.reynolds, ...present({ includedReason: row.includedReason }) };
}

function facilityInput(row: FacilityRow): FacilityInput {
  const { id, name, kind, areaM2, blockage, biasURelative, biasUM2, sessionURelative, sessionUM2 } = row;
  const { sessionDegreesOfFreedom, installationURelative, installationUM2 } = row;
  const { installationDegreesOfFreedom, repeatabilityURelative, repeatabilityDegreesOfFreedom } = row;
  return {
    id,
    name,
    kind,
    ...present({
      areaM2,
      blockage,
      biasURelative,
      biasUM2,
      sessionURelative,
      sessionUM2,
      sessionDegreesOfFreedom,
      installationURelative,
      installationUM2,
      installationDegreesOfFreedom,
      repeatabilityURelative,
      repeatabilityDegreesOfFreedom,
    }),
  };
}

function variantInput(
  { id, name }: VariantRow,
  area: AreaRow,
  base: ConfigurationRow | undefined,
): VariantInput {
  return {
    id,
    name,
    frontalAreaM2: area.areaM2,
    frontalAreaUM2: area.uM2,
    ...present({
      massKg: base?.massKg,
      rollingResistance: base?.rollingResistance,
      roadLoadReference: base?.roadLoadReference,
    }),
  };
}

/** The common area and where it comes from. */
export interface CommonArea {
  readonly policy: CommonAreaPolicy;
  readonly areaM2: number;
}

function areaOfPolicy(policy: CommonAreaPolicy, areas: readonly AreaRow[]): CommonArea | null {
  if (policy.kind === 'fixed') return { policy, areaM2: policy.areaM2 };
  const area = areas.find(({ variantId }) => variantId === policy.variantId);
  return area ? { policy, areaM2: area.areaM2 } : null;
}

/**
 * The programme's common area; where none is chosen there, or it is that of a variant that has left, the one that the
 * person asks for. Null where there is neither.
 */
export function commonAreaOf(rows: ProgrammeRows, asked: AreaChoice): CommonArea | null {
  const own = rows.programme.commonArea && areaOfPolicy(rows.programme.commonArea, rows.areas);
  if (own) return own;
  if (asked.kind === 'typed') return areaOfPolicy({ kind: 'fixed', areaM2: asked.areaM2 }, rows.areas);
  return asked.kind === 'variant' ? areaOfPolicy(asked, rows.areas) : null;
}

/**
 * The machine entry's input of the operation `rank` for a programme, with names. Variants carry the mass and road load of
 * their base configuration.
 */
export function rankingInputs(
  rows: RankingRows,
  commonAreaM2: number,
  evidence: ConsideredEvidence,
): RankingInput {
  const { programme } = rows;
  const areaOf = new Map(rows.areas.map((area) => [area.variantId, area]));
  const configurationsOf = grouped(rows.configurations, ({ variantId }) => variantId);
  const pointsOf = grouped(rows.points, ({ resultId }) => resultId);
  const judgementOf = new Map(rows.judgements.map((row) => [row.resultId, row]));
  const results = rows.results.map((row) =>
    judgedResult(resultInput(row, pointsOf.get(row.id) ?? []), judgementInput(judgementOf.get(row.id))),
  );
  const decisions = decisionsOf(rows);
  const considered = consideredResults(results, decisions, evidence);
  const variants = rows.variants.flatMap((variant) => {
    const area = areaOf.get(variant.id);
    return area ? [variantInput(variant, area, configurationsOf.get(variant.id)?.[0])] : [];
  });
  const models = [...new Set(considered.flatMap(({ modelId }) => modelId ?? []))].sort();
  const document: RankingInput = {
    programme: {
      name: programme.name,
      referenceSpeedKmh: programme.referenceSpeedKmh,
      referenceAir: programme.referenceAir,
      characteristicLengthM: programme.characteristicLengthM,
      commonAreaM2,
      confidence: programme.confidence,
      ...present({ referenceFacilityId: programme.referenceFacilityId }),
      referenceCondition: programme.referenceCondition,
      windSpeedMs: programme.windSpeedMs,
      policies: policiesInputOf(rows.policies.values, rows.policies.number, programme.frictionLine),
    },
    facilities: rows.facilities.map(facilityInput),
    models: models.map((id) => ({ id, name: id })),
    variants: evidence === 'adopted' ? ruledVariants(variants, decisions, evidence) : variants,
    results: considered,
    adjustments: rows.adjustments,
    correlations: correlationsOf(rows).map(({ input }) => input),
  };
  // The sweep of a result that is ranked may be that of one that is not.
  return withSweeps(document, results);
}

/** Of the correlations in use those from facilities that the programme has results of. */
function correlationsOf({ correlations, results }: ProgrammeRows): readonly CorrelationInUse[] {
  const facilities = new Set(results.map(({ facilityId }) => facilityId));
  return correlations.filter(({ input }) => facilities.has(input.facilityId));
}

/** What a person is told of the correlations that the inputs hold. */
export function contextCorrelations(rows: ProgrammeRows): RankingContext['correlations'] {
  return correlationsOf(rows).map(({ input, name, number, since, adoptedBy }) => ({
    id: input.id,
    name,
    number,
    since,
    by: adoptedBy,
  }));
}

/** The entries in facilities that results name, each once, by name. */
export function sessionsOf(results: readonly ResultRow[]): RankingContext['sessions'] {
  const names = new Map(
    results.flatMap(({ testSessionId: id, sessionName }) =>
      id === null || sessionName === null ? [] : [[id, sessionName] as const],
    ),
  );
  return [...names]
    .map(([id, name]) => ({ id, name }))
    .sort((a, b) => a.name.localeCompare(b.name) || a.id.localeCompare(b.id));
}

/** What a person sees of the variants beside their figures. */
export function contextVariants(rows: ProgrammeRows): RankingContext['variants'] {
  const areaOf = new Map(rows.areas.map((area) => [area.variantId, area]));
  const configurationsOf = grouped(rows.configurations, ({ variantId }) => variantId);
  return rows.variants.flatMap((variant) => {
    const area = areaOf.get(variant.id);
    if (!area) return [];
    const { id, name, bodyShape, description, lengthMm, widthMm, heightMm, wheelbaseMm } = variant;
    return {
      id,
      name,
      bodyShape,
      ...present({ description, lengthMm, widthMm, heightMm, wheelbaseMm }),
      frontalAreaMethod: area.method,
      frontalAreaDate: area.date,
      configurations: (configurationsOf.get(id) ?? []).map((row) => ({
        id: row.id,
        name: row.name,
        massKg: row.massKg,
        ...present({
          rollingResistance: row.rollingResistance,
          roadLoadReference: row.roadLoadReference,
        }),
        salesShare: row.salesShare,
      })),
    };
  });
}
