import {
  type NonNullableFormBuilder,
  type ValidationErrors,
  type AbstractControl,
  Validators,
} from '@angular/forms';
import type { TestSessionFields } from '#shared/contracts/test-sessions';
import { withoutBlanks } from '../../core/editing/without-blanks';

/** The last day cannot come before the first; said at the last day, where it is mended. */
function endAfterStart(end: AbstractControl<string>): ValidationErrors | null {
  const start: unknown = end.parent?.get('startDate')?.value;
  const wrong = typeof start === 'string' && start !== '' && end.value !== '' && end.value < start;
  return wrong
    ? { server: $localize`A session cannot end before it begins. Choose the first day or a later one.` }
    : null;
}

export function sessionForm(builder: NonNullableFormBuilder) {
  return builder.group({
    name: ['', [Validators.required, Validators.maxLength(120)]],
    startDate: [''],
    endDate: ['', [endAfterStart]],
    remark: ['', [Validators.maxLength(4000)]],
  });
}
export type SessionForm = ReturnType<typeof sessionForm>;

export function setSession(form: SessionForm, fields: TestSessionFields): void {
  const { name, startDate = '', endDate = '', remark = '' } = fields;
  form.reset({ name, startDate, endDate, remark });
}

export function sessionFieldsOf(form: SessionForm): TestSessionFields {
  const { name, startDate, endDate, remark } = form.getRawValue();
  return { name: name.trim(), ...withoutBlanks({ startDate, endDate, remark }) };
}
