/** Why a file cannot be taken as a figure, in a sentence for the person who chose it. */
export class UnusablePicture extends Error {
  readonly code: 'unsupportedFile' | 'tooLarge';

  constructor(reason: string, code: 'unsupportedFile' | 'tooLarge' = 'unsupportedFile') {
    super(reason);
    this.code = code;
  }
}
