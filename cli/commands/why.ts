import type { Command } from 'commander';
import type { Context } from './context.ts';

export function addWhy(_program: Command, _context: Context): void {}
