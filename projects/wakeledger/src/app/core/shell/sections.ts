import type { Permission } from '#shared/access/permissions';

export interface Section {
  readonly words: string;
  readonly link: readonly string[];
  /** Shown to those who hold any of these. */
  readonly needs: readonly Permission[];
}

/** The sections of one programme, in the order of the work. */
export function programmeSections(programmeId: string): readonly Section[] {
  const at = (page: string): readonly string[] => ['/programmes', programmeId, page];
  return [
    { words: $localize`Ranking`, link: at('ranking'), needs: ['ranking-inputs.read', 'ranking-view.read'] },
    { words: $localize`Variants`, link: at('variants'), needs: ['variants.read'] },
    { words: $localize`Results`, link: at('results'), needs: ['results.read'] },
    { words: $localize`Proposals`, link: at('proposals'), needs: ['proposals.read'] },
    { words: $localize`Import`, link: at('import'), needs: ['imports.run'] },
    { words: $localize`Test planning`, link: at('test-plans'), needs: ['plans.read'] },
    { words: $localize`Reference`, link: at('settings'), needs: ['programmes.read'] },
  ];
}

/** What the organisation shares among its programmes. */
export function organisationSections(): readonly Section[] {
  return [
    { words: $localize`Programmes`, link: ['/programmes'], needs: ['programmes.read'] },
    { words: $localize`Facilities`, link: ['/facilities'], needs: ['facilities.read'] },
    { words: $localize`Adjustments`, link: ['/adjustments'], needs: ['facilities.read'] },
    { words: $localize`Correlations`, link: ['/correlations'], needs: ['facilities.read'] },
    { words: $localize`Policies`, link: ['/policies'], needs: ['policies.read'] },
    { words: $localize`Cycles`, link: ['/cycles'], needs: ['cycles.read'] },
  ];
}
