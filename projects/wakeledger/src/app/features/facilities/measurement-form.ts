import { type NonNullableFormBuilder, Validators } from '@angular/forms';
import type { CheckMeasurementFields } from '#shared/contracts/test-sessions';
import { withoutBlanks } from '../../core/editing/without-blanks';

export function measurementForm(builder: NonNullableFormBuilder) {
  return builder.group({
    testSessionId: ['', [Validators.required]],
    measuredOn: ['', [Validators.required]],
    dragAreaM2: builder.control<number | null>(null),
    s: builder.control<number | null>(null),
    n: builder.control<number | null>(null),
    remark: ['', [Validators.maxLength(4000)]],
  });
}
export type MeasurementForm = ReturnType<typeof measurementForm>;

/** What the form says; undefined while no drag area stands in it. */
export function measurementFieldsOf(form: MeasurementForm): CheckMeasurementFields | undefined {
  const { testSessionId, measuredOn, dragAreaM2, s, n, remark } = form.getRawValue();
  if (dragAreaM2 === null) return undefined;
  return { testSessionId, measuredOn, dragAreaM2, ...withoutBlanks({ s, n, remark }) };
}

/** For the next measurement: of the same session and day, as they are taken one after the other. */
export function clearForNext(form: MeasurementForm): void {
  const { testSessionId, measuredOn } = form.getRawValue();
  form.reset({ testSessionId, measuredOn });
}
