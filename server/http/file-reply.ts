/** A reply that is a file instead of JSON. */
export class FileReply {
  readonly bytes: Uint8Array;
  readonly mediaType: string;
  /** Name under which a browser saves it; null shows it in place. */
  readonly fileName: string | null;
  readonly headers: Readonly<Record<string, string>>;

  constructor(
    bytes: Uint8Array,
    mediaType: string,
    options: { fileName?: string; headers?: Readonly<Record<string, string>> } = {},
  ) {
    this.bytes = bytes;
    this.mediaType = mediaType;
    this.fileName = options.fileName ?? null;
    this.headers = options.headers ?? {};
  }
}
