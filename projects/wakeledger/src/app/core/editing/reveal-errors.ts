import { FormArray, FormControl, FormGroup, type AbstractControl } from '@angular/forms';

/** Before saving: lets every field say what is wrong with it, as if the person had been in each. */
export function revealErrors(control: AbstractControl): void {
  if (control instanceof FormGroup || control instanceof FormArray) {
    for (const child of Object.values<AbstractControl>(control.controls)) revealErrors(child);
  }
  control.markAsTouched({ onlySelf: true });
  if (control instanceof FormControl && control.enabled) control.updateValueAndValidity();
}

/** Puts the focus on the first field that is not right. */
export function focusFirstFault(host: HTMLElement): void {
  host.querySelector<HTMLElement>('[aria-invalid="true"]')?.focus();
}
