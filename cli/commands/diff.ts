import type { Command } from 'commander';
import type { Context } from './context.ts';

export function addDiff(_program: Command, _context: Context): void {}
