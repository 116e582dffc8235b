/** One thing that a word of a sentence can be. */
export interface Option<T extends string> {
  readonly value: T;
  /** As it reads in the sentence. */
  readonly label: string;
  /** What helps to choose, in the open list alone. */
  readonly hint?: string;
}
