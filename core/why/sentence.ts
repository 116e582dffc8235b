/** One slip between what a tensor is and how it was read. */
export interface Step {
  readonly kind: 'order' | 'sign' | 'point' | 'unit' | 'turn' | 'axes' | 'mirror';
  readonly words: string;
}

export interface Explanation {
  /** "B is A with its products negated, read in lb·in², not kg·m²." */
  sentence: string;
  steps: Step[];
  /** Largest deviation left, as a share of A's largest element. */
  residual: number;
  /** Every element agrees within half a unit of the digits given. */
  withinDigits: boolean;
  /** Whether a body can have B under this reading. */
  possible: boolean;
  /** Whether the centres agree under it too; null where one is not given. */
  centresAgree: boolean | null;
}

export interface Explanations {
  /** The two are the same as declared. */
  agree: boolean;
  /** At least one reading makes them the same. */
  explained: boolean;
  /** Best first; near misses where nothing explains. */
  explanations: Explanation[];
  /** Where the two disagree as declared, about the centre, products negative [kg·m²], largest first. */
  differences: { element: string; a: number; b: number; difference: number }[];
  summary: string;
}

export function sentenceOf(steps: readonly Step[], centresAgree: boolean | null): string {
  if (steps.length === 0)
    return `B is A: the two agree as they are declared${centresAgree === false ? '; their centres do not' : ''}.`;
  return `B is A ${steps.map((s) => s.words).join(', ')}.`;
}

/** The whole answer in a sentence or two. */
export function summaryOf(explanations: readonly Explanation[], explained: boolean): string {
  const [first, ...rest] = explanations;
  if (!first) return 'No single convention or pair of them makes B into A: the bodies themselves differ.';
  if (!explained)
    return `Nothing explains it within the digits given; nearest, with ${percent(first.residual)} left: ${first.sentence}`;
  const alike = rest.filter((r) => r.steps.length === first.steps.length).length;
  return alike === 0
    ? first.sentence
    : `${first.sentence} ${alike} other reading${alike === 1 ? '' : 's'} with as few slips would do as well.`;
}

const percent = (share: number): string => `${Number((100 * share).toPrecision(2))} % of the largest element`;
