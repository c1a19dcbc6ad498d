/** Ways of writing numbers, by where they are at home; the first is the default. */
export const NUMBER_LOCALES = ['en-GB', 'de-DE', 'fr-FR', 'de-CH'] as const;
export type NumberLocale = (typeof NUMBER_LOCALES)[number];

export interface NumberMarks {
  readonly decimal: string;
  readonly group: string;
}

const MARKS: Readonly<Record<NumberLocale, NumberMarks>> = {
  'en-GB': { decimal: '.', group: ',' },
  'de-DE': { decimal: ',', group: '.' },
  'fr-FR': { decimal: ',', group: '\u202f' },
  'de-CH': { decimal: '.', group: '’' },
};

export function marksOf(locale: NumberLocale): NumberMarks {
  return MARKS[locale];
}
