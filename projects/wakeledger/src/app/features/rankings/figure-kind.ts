/** The figures of a row that can be derived. */
export type FigureKind = 'drag-area' | 'common-area' | 'own-area' | 'energy';
