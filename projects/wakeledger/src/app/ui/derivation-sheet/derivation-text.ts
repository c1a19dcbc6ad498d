import type { Derivation } from './derivation';

/** The derivation as plain text, for a report or a message; its numbers can be calculated on. */
export function derivationText(derivation: Derivation): string {
  const { figure, summary, steps, budget, budgetNote } = derivation;
  const lines = [$localize`Derivation`, figure.plain, summary, ''];
  steps.forEach((step, index) => {
    lines.push(`${index + 1}  ${step.title} = ${step.result.plain}`);
    lines.push(`   ${step.formulaText}`);
    if (step.values.plain) lines.push(`   ${step.values.plain}`);
    lines.push($localize`   source: ${step.source}:SOURCE: (${step.method}:METHOD:)`);
    if (step.changed) lines.push($localize`   changed: ${step.changed}:CHANGED:`);
    for (const assumed of step.assumed) lines.push($localize`   assumed: ${assumed}:ASSUMED:`);
    for (const caution of step.cautions) lines.push($localize`   caution: ${caution}:CAUTION:`);
  });
  if (budget.length) {
    lines.push('', $localize`Where the uncertainty comes from`);
    for (const { label, share, u: standard } of budget) {
      lines.push(`   ${percent(share).padStart(5)}  ${label}${standard ? ` (u = ${standard.plain})` : ''}`);
    }
  }
  if (budgetNote) lines.push(budgetNote);
  return lines.join('\n');
}

export function percent(share: number): string {
  const value = share * 100;
  return value > 0 && value < 0.5 ? '< 1 %' : `${Math.round(value)} %`;
}
