/** A file that cannot become a table, in words for a person. */
export class UnreadableFile extends Error {
  override readonly name = 'UnreadableFile';
  constructor(
    readonly code: 'too-large' | 'unsupported-file' | 'unusable-input',
    readonly detail: string,
  ) {
    super(detail);
  }
}
