import type { AbstractControl, ValidationErrors } from '@angular/forms';

/** What is wrong with a text, date or choice in words; undefined until the person has been there. */
export function controlError(control: AbstractControl): string | undefined {
  if (!control.errors || !(control.touched || control.errors['server'])) return undefined;
  return errorWords(control.errors);
}

function errorWords(errors: ValidationErrors): string {
  if (errors['server']) return String(errors['server']);
  if (errors['required']) return $localize`This is needed.`;
  if (errors['maxlength']) {
    return $localize`At most ${errors['maxlength'].requiredLength}:COUNT: characters; these are ${errors['maxlength'].actualLength}:ACTUAL:.`;
  }
  if (errors['minlength'])
    return $localize`At least ${errors['minlength'].requiredLength}:COUNT: characters.`;
  if (errors['email']) return $localize`Write an e-mail address, such as name@example.org.`;
  return $localize`This cannot be used as it is.`;
}

/** Puts what the server said about fields onto their controls; what names no control is left for the banner. */
export function showIssues(
  form: AbstractControl,
  issues: readonly { readonly where: string; readonly detail: string }[],
): readonly { readonly where: string; readonly detail: string }[] {
  return issues.filter(({ where, detail }) => {
    const control = form.get(where.replace(/^body\./, '').replace(/\[(\d+)\]/g, '.$1'));
    control?.setErrors({ ...control.errors, server: detail });
    control?.markAsTouched();
    return !control;
  });
}
