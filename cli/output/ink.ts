import pc from 'picocolors';

type Paint = (text: string) => string;

/** How a report meets its terminal: colours by role, or none; marks that the terminal can show. */
export interface Ink {
  readonly unicode: boolean;
  readonly strong: Paint;
  readonly soft: Paint;
  readonly brass: Paint;
  readonly within: Paint;
  readonly outside: Paint;
}

export function createInk({ colour, unicode }: { colour: boolean; unicode: boolean }): Ink {
  const c = pc.createColors(colour);
  return {
    unicode,
    strong: c.bold,
    soft: c.dim,
    brass: c.yellow,
    within: c.cyan,
    outside: (text) => c.bold(c.red(text)),
  };
}
