import { blockageVerdict } from '../reduction/blockage';
import type { Reduction } from '../reduction/reduction';
import { isTunnel } from '../reduction/result-parts';
import { machVerdict } from '../similarity/flow';
import { check, limit, within, type Check } from './check';
import type { CheckLimits } from './limits';

/** The highest Mach number of the points against the limits (method section 4); nothing where no speed or air is stated. */
export function machCheck({ output }: Reduction, limits: CheckLimits): Check[] {
  if (output.mach === null) return [];
  return [
    check({
      check: 'mach',
      verdict: machVerdict(output.mach, limits),
      value: output.mach,
      limit: limit({ to: limits.machCaution, excludedAbove: limits.machExcluded }),
      policy: 'machCaution',
    }),
  ];
}

/** How much of the section or nozzle the model fills (method section 5); nothing outside tunnels. */
export function blockageCheck({ parts }: Reduction, limits: CheckLimits): Check[] {
  const { tunnel, facility } = parts;
  if (tunnel === null || !isTunnel(facility.kind)) return [];
  const openJet = facility.kind === 'open-jet';
  return [
    check({
      check: 'blockage',
      verdict: blockageVerdict(facility.kind, tunnel.blockageRatio, limits),
      value: tunnel.blockageRatio,
      unit: 'fraction',
      limit: openJet
        ? limit({ excludedAbove: limits.openJetLimit })
        : limit({ to: limits.blockageCaution, excludedAbove: limits.blockageExcluded }),
      policy: openJet ? 'openJetLimit' : 'blockageCaution',
    }),
  ];
}

/**
 * How far the figure was moved to the reference Reynolds number by an estimate [m²], against what the organisation tolerates
 * (method section 6): a measured sweep needs no look. Nothing where a correlation stands for the step or no friction is
 * assumed at all.
 */
export function reynoldsCheck({ reynolds }: Reduction, limits: CheckLimits): Check[] {
  const told = { check: 'reynolds', unit: 'm²', policy: 'reynoldsToleranceM2' } as const;
  const upTo = limit({ to: limits.reynoldsToleranceM2 });
  switch (reynolds.kind) {
    case 'replaced':
    case 'none':
      return [];
    case 'own-sweep':
      return [check({ ...told, verdict: 'passes', limit: upTo, finding: 'own-sweep' })];
    case 'sweep':
      return [check({ ...told, verdict: 'passes', limit: upTo, finding: 'other-sweep' })];
    case 'friction-line': {
      // The shape's amount is half of the move by definition, signed.
      const movedM2 = Math.abs(2 * reynolds.move.reynoldsShapeAmountM2);
      const finding = reynolds.applied ? 'friction-line' : 'no-reynolds-correction';
      return [check({ ...told, verdict: within(movedM2, upTo), value: movedM2, limit: upTo, finding })];
    }
  }
}

/**
 * Whether transition may sit in the wrong place on a scale model: under the minimum Reynolds number without turbulence
 * generation or trips, unless a flat sweep that reaches above it has shown that it does not matter (method sections 4 and 6).
 */
export function transitionCheck({ output, parts }: Reduction, limits: CheckLimits): Check[] {
  if (parts.scale >= 1 || output.reynolds === null) return [];
  const below = output.reynolds < limits.minimumReynolds;
  const cautioned = output.cautions.includes('transition');
  const tripped = parts.result.turbulenceGenerationOrTrips === true;
  return [
    check({
      check: 'transition',
      verdict: cautioned ? 'caution' : 'passes',
      value: output.reynolds,
      limit: limit({ from: limits.minimumReynolds }),
      policy: 'minimumReynolds',
      finding: !below || cautioned ? null : tripped ? 'trips' : 'flat-sweep',
    }),
  ];
}
