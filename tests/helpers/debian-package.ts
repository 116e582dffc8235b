import { execFileSync } from 'node:child_process';

/**
 * Files of a Debian package, installed where it is missing (as root, or by sudo that asks nothing).
 *
 * @returns the files, or why they cannot be had here
 */
export function filesOfPackage(name: string): { files: string[] } | { missing: string } {
  const list = () => run('dpkg', ['-L', name]).split('\n').filter(Boolean);
  try {
    return { files: list() };
  } catch {
    try {
      const apt = process.getuid?.() === 0 ? [] : ['sudo', '-n'];
      const install = () => apt_(apt, ['install', '-y', '--no-install-recommends', name]);
      try {
        install();
      } catch {
        apt_(apt, ['update']);
        install();
      }
      return { files: list() };
    } catch (error) {
      const why = error instanceof Error ? error.message.split('\n')[0] : String(error);
      return { missing: `Debian's package ${name} is not installed and cannot be installed here: ${why}` };
    }
  }
}

const run = (command: string, args: string[]): string =>
  execFileSync(command, args, { encoding: 'utf8', stdio: ['ignore', 'pipe', 'pipe'] });

function apt_(prefix: readonly string[], args: readonly string[]): void {
  const [command, ...rest] = [...prefix, 'env', 'DEBIAN_FRONTEND=noninteractive', 'apt-get', ...args];
  execFileSync(command!, rest, { stdio: ['ignore', 'ignore', 'pipe'], timeout: 200_000 });
}
