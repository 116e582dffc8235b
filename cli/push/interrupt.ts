import { EXIT } from '../exit-status.ts';
import type { Io } from '../io.ts';
import type { Outgoing } from './outgoing.ts';

/** While records are on their way, Ctrl-C lets go of them and says where they are. */
export class InterruptWatch {
  /** What this process has in hand. */
  items: readonly Outgoing[] = [];
  readonly #obey: () => void;

  constructor(io: Io) {
    this.#obey = () => {
      for (const item of this.items) item.release();
      const kept = this.items.filter((item) => item.kept).length;
      io.err(
        kept > 0
          ? `\ninterrupted; what was not sent waits in the tray, and \`steelyard push\` sends it\n`
          : '\ninterrupted\n',
      );
      process.exit(EXIT.interrupted);
    };
    process.on('SIGINT', this.#obey);
  }

  stop(): void {
    process.removeListener('SIGINT', this.#obey);
  }
}
