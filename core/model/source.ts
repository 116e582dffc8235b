/** A text input as a project source hands it over. */
export interface TextInput {
  /** Raw text with line ends as LF. */
  readonly text: string;
  /** SHA-256 of that text as UTF-8, lower-case hex. */
  readonly sha256: string;
}

/** A mesh file's bytes and their SHA-256. */
export interface BytesInput {
  readonly bytes: Uint8Array;
  readonly sha256: string;
}

/**
 * Where a project's files come from: the disk, a stored record's inputs, an upload. Paths are relative to the
 * project folder with `/`. Every method throws InputError with a FILE_… fault that says what to mend.
 */
export interface ProjectSource {
  /**
   * The project path of a file as another names it.
   *
   * @throws InputError FILE_OUTSIDE_PROJECT, FILE_MISSING
   */
  resolve(from: string, named: string): string;
  /** @throws InputError FILE_MISSING, FILE_UNREADABLE, TEXT_TOO_LARGE, TEXT_NOT_UTF8 */
  readText(path: string): TextInput;
  /** @throws InputError FILE_MISSING, FILE_UNREADABLE, MESH_TOO_LARGE */
  readBytes(path: string): BytesInput;
}
