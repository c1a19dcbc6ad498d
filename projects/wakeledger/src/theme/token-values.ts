/** The colour tokens of `_tokens.scss`, by name. */
export const COLOUR_TOKENS = [
  'paper',
  'sheet',
  'rule',
  'edge',
  'ink',
  'petrol',
  'ochre',
  'moss',
  'rust',
  'plum',
  'selected',
  'hover',
  'notice',
  'band',
] as const;
export type ColourToken = (typeof COLOUR_TOKENS)[number];

export type ColourValues = Readonly<Record<ColourToken, string>>;

/**
 * The colours as they stand now. Charts need values rather than references: they are saved as pictures, and a picture
 * takes no custom properties along.
 */
export function colourValues(root: Element): ColourValues {
  const style = getComputedStyle(root);
  return Object.fromEntries(
    COLOUR_TOKENS.map((token) => [token, style.getPropertyValue(`--wl-${token}`).trim()]),
  ) as ColourValues;
}
