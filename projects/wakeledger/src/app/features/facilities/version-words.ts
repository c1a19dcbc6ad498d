import type { FacilityFields, FacilityVersion } from '#shared/contracts/facilities';
import type { ComparedField } from '../../core/editing/conflict-rows';

export interface VersionLine {
  readonly version: FacilityVersion;
  /** What differs from the version before, each as `Session: 0.20 % → 0.15 %, ν 4`. */
  readonly differences: readonly string[];
  /** Nothing came before it. */
  readonly first: boolean;
}

/** The versions with what changed in each, newest first as they come. */
export function versionLines(
  versions: readonly FacilityVersion[],
  fields: readonly ComparedField<FacilityFields>[],
): readonly VersionLine[] {
  return versions.map((version, place) => {
    const before = versions[place + 1];
    if (before === undefined) return { version, differences: [], first: true };
    const differences = fields.flatMap(({ label, read }) => {
      const [was, is] = [read(before.fields), read(version.fields)];
      return was === is ? [] : [`${label}: ${was || $localize`nothing`} → ${is || $localize`nothing`}`];
    });
    return { version, differences, first: false };
  });
}
