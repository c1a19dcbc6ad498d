import { type FormControl, type NonNullableFormBuilder, Validators } from '@angular/forms';
import type { PolicyValues } from '#shared/contracts/policies';
import { BODY_SHAPES } from '#shared/contracts/variants';
import { limitIssues, type LimitRule } from '#shared/core/checks/limit-issues';
import { LIMIT_FIELDS, type LimitField } from './limit-fields';

/** Takes off what a change of unit adds in the sixteenth digit, so that 35 % stays 35 % both ways. */
const tidy = (value: number): number => Number(value.toPrecision(12));

/** Controls named as the contract names the limits, in the units in which they are typed. */
export function policiesForm(builder: NonNullableFormBuilder) {
  const number = (): FormControl<number | null> => builder.control<number | null>(null);
  const range = () => builder.group({ from: number(), to: number() });
  return builder.group({
    machCaution: number(),
    machExcluded: number(),
    blockageCaution: number(),
    blockageExcluded: number(),
    openJetLimit: number(),
    minimumReynolds: number(),
    reynoldsToleranceM2: number(),
    frictionShare: number(),
    frictionShareU: number(),
    yawCoverageDeg: number(),
    repeatabilityCaution: number(),
    airTemperatureC: range(),
    airPressurePa: range(),
    frontLiftLimit: number(),
    rearLiftLimit: number(),
    plausible: builder.array(
      BODY_SHAPES.map(() => builder.group({ dragCoefficient: range(), frontalAreaM2: range() })),
    ),
    comment: ['', [Validators.required, Validators.minLength(3), Validators.maxLength(1000)]],
  });
}
export type PoliciesForm = ReturnType<typeof policiesForm>;

function at(value: unknown, path: string): number | undefined {
  const found = path
    .split('.')
    .reduce<unknown>(
      (inner, key) =>
        typeof inner === 'object' && inner !== null ? (inner as Record<string, unknown>)[key] : undefined,
      value,
    );
  return typeof found === 'number' ? found : undefined;
}

/** The limits with one line per body shape in the order of the form; a shape without limits has none. */
function inFormOrder(values: PolicyValues): object {
  const byShape = new Map(values.plausible.map((body) => [body.bodyShape, body]));
  return { ...values, plausible: BODY_SHAPES.map((shape) => byShape.get(shape)) };
}

/** One figure as it is typed; undefined where there is none. */
export function typedFigure(values: PolicyValues, { path, factor }: LimitField): number | undefined {
  const held = at(inFormOrder(values), path);
  return held === undefined ? undefined : tidy(held / factor);
}

export function fillPoliciesForm(form: PoliciesForm, values: PolicyValues): void {
  for (const field of LIMIT_FIELDS) form.get(field.path)?.reset(typedFigure(values, field) ?? null);
  form.controls.comment.reset('');
}

/** The limits as the contract wants them; what is empty or unreadable is not a number. */
export function readPoliciesForm(form: PoliciesForm): PolicyValues {
  const factors = new Map(LIMIT_FIELDS.map(({ path, factor }) => [path, factor]));
  const { comment: _comment, ...typed } = form.getRawValue();
  const held = (value: number | null, path: string): number =>
    value === null ? Number.NaN : tidy(value * (factors.get(path) ?? 1));
  const range = (value: { readonly from: number | null; readonly to: number | null }, path: string) => ({
    from: held(value.from, `${path}.from`),
    to: held(value.to, `${path}.to`),
  });
  return {
    machCaution: held(typed.machCaution, 'machCaution'),
    machExcluded: held(typed.machExcluded, 'machExcluded'),
    blockageCaution: held(typed.blockageCaution, 'blockageCaution'),
    blockageExcluded: held(typed.blockageExcluded, 'blockageExcluded'),
    openJetLimit: held(typed.openJetLimit, 'openJetLimit'),
    minimumReynolds: held(typed.minimumReynolds, 'minimumReynolds'),
    reynoldsToleranceM2: held(typed.reynoldsToleranceM2, 'reynoldsToleranceM2'),
    frictionShare: held(typed.frictionShare, 'frictionShare'),
    frictionShareU: held(typed.frictionShareU, 'frictionShareU'),
    yawCoverageDeg: held(typed.yawCoverageDeg, 'yawCoverageDeg'),
    repeatabilityCaution: held(typed.repeatabilityCaution, 'repeatabilityCaution'),
    airTemperatureC: range(typed.airTemperatureC, 'airTemperatureC'),
    airPressurePa: range(typed.airPressurePa, 'airPressurePa'),
    frontLiftLimit: held(typed.frontLiftLimit, 'frontLiftLimit'),
    rearLiftLimit: held(typed.rearLiftLimit, 'rearLiftLimit'),
    plausible: BODY_SHAPES.map((bodyShape, position) => {
      const body = typed.plausible[position];
      const none = { from: null, to: null };
      return {
        bodyShape,
        dragCoefficient: range(body?.dragCoefficient ?? none, `plausible.${position}.dragCoefficient`),
        frontalAreaM2: range(body?.frontalAreaM2 ?? none, `plausible.${position}.frontalAreaM2`),
      };
    }),
  };
}

const RULE_WORDS: Readonly<Record<LimitRule, string>> = {
  'above-zero': $localize`This limit is above 0.`,
  fraction: $localize`This limit lies between 0 and 100 %.`,
  'caution-above-excluded': $localize`The caution would begin only where results are excluded already. Choose a value up to the limit of exclusion.`,
  'from-not-below-to': $localize`The range ends at or below where it begins. Choose an end above its beginning.`,
  twice: $localize`This body shape has a range already.`,
  'not-a-number': $localize`A number is needed here.`,
};

/** What is wrong between the limits, in words, where each field alone is right. */
export function contradictions(
  values: PolicyValues,
): readonly { readonly where: string; readonly detail: string }[] {
  return limitIssues(values).map(({ where, rule }) => ({ where, detail: RULE_WORDS[rule] }));
}
