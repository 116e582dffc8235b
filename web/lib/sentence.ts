/** The server's words, which begin small and end open, as a sentence of the page. */
export function asSentence(text: string): string {
  const closed = /[.!?…:]$/.test(text) ? text : `${text}.`;
  return closed.charAt(0).toUpperCase() + closed.slice(1);
}
