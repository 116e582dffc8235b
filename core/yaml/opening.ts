/**
 * Where the bracket or quote stands that the parser found open: it notices at the end of the text, or at the
 * first line that is not indented enough to be inside.
 *
 * @param noticed the offset where the parser stopped
 * @returns undefined for any other reason
 */
export function openingOf(reason: string, text: string, noticed: number): number | undefined {
  if (reason.startsWith('deficient indentation')) {
    const bracket = openBracket(text.slice(0, noticed));
    return bracket < 0 ? undefined : bracket;
  }
  if (!reason.startsWith('unexpected end of the stream within a')) return undefined;
  const offset = findOpening(reason, text);
  return offset >= 0 ? offset : undefined;
}

function findOpening(reason: string, text: string): number {
  if (reason.includes('flow collection')) return openBracket(text);
  if (reason.includes('double quoted')) return lastQuote(text, '"', '\\');
  if (reason.includes('single quoted')) return lastQuote(text, "'", "'");
  return -1;
}

/** The last bracket that no later one closes. */
function openBracket(text: string): number {
  let closed = 0;
  for (let i = text.length - 1; i >= 0; i--) {
    const character = text[i]!;
    if (character === ']' || character === '}') closed++;
    else if ((character === '[' || character === '{') && --closed < 0) return i;
  }
  return -1;
}

/** The last quote that is not one escaped inside the open text. */
function lastQuote(text: string, quote: string, escapeSign: string): number {
  let at = text.lastIndexOf(quote);
  while (at > 0 && text[at - 1] === escapeSign) at = text.lastIndexOf(quote, at - 2);
  return at;
}
