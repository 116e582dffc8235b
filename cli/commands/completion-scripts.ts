import type { Command } from 'commander';

export const SHELLS: readonly string[] = ['bash', 'zsh', 'fish'];

interface Known {
  readonly name: string;
  readonly about: string;
  /** Whether it takes anything but options. */
  readonly takesFiles: boolean;
  readonly options: readonly {
    flag: string;
    about: string;
    takesValue: boolean;
    choices: readonly string[];
  }[];
}

/** A completion script for a shell, made from the commands and options as they are. */
export function completionScript(shell: string, program: Command): string {
  const commands = program.commands.map(known);
  if (shell === 'fish') return fish(commands);
  return shell === 'zsh' ? zsh(commands) : bash(commands);
}

function known(command: Command): Known {
  return {
    name: command.name(),
    about: command.description().split('\n')[0] ?? '',
    takesFiles: command.registeredArguments.length > 0,
    options: command.options.map((o) => ({
      flag: o.long ?? o.short ?? '',
      about: o.description,
      takesValue: o.required || o.optional,
      choices: o.argChoices ?? [],
    })),
  };
}

const flagsOf = (command: Known) => command.options.map((o) => o.flag).join(' ');

function bash(commands: readonly Known[]): string {
  const cases = commands.map((c) => `    ${c.name}) words="${flagsOf(c)} --help" ;;`).join('\n');
  const choices = [...new Map(commands.flatMap((c) => c.options.map((o) => [o.flag, o.choices]))).entries()]
    .filter(([, list]) => list.length > 0)
    .map(
      ([flag, list]) =>
        `    ${flag}) COMPREPLY=( $(compgen -W "${list.join(' ')}" -- "$current") ); return ;;`,
    )
    .join('\n');
  const bare = commands.filter((c) => !c.takesFiles).map((c) => c.name);
  return `# bash completion for steelyard
_steelyard() {
  local current="\${COMP_WORDS[COMP_CWORD]}" command="\${COMP_WORDS[1]}" words
  COMPREPLY=()
  if [ "$COMP_CWORD" -eq 1 ]; then
    COMPREPLY=( $(compgen -W "${commands.map((c) => c.name).join(' ')} --help --version" -- "$current") )
    return
  fi
  case "$command" in
${cases}
    *) words="--help" ;;
  esac
  case "\${COMP_WORDS[COMP_CWORD-1]}" in
${choices}
  esac
  if [[ "$current" == -* ]]; then
    COMPREPLY=( $(compgen -W "$words" -- "$current") )
  elif [ "$command" = completion ]; then
    COMPREPLY=( $(compgen -W "${SHELLS.join(' ')}" -- "$current") )
  elif [[ " ${bare.join(' ')} " != *" $command "* ]] || [[ "\${COMP_WORDS[COMP_CWORD-1]}" == -* ]]; then
    COMPREPLY=( $(compgen -f -- "$current") )
  fi
}
complete -o filenames -F _steelyard steelyard
`;
}

const quoted = (text: string) => text.replace(/'/g, `'\\''`);
const zshAbout = (text: string) => quoted(text.replace(/[[\]:]/g, '\\$&'));

function zsh(commands: readonly Known[]): string {
  const list = commands.map((c) => `    '${c.name}:${zshAbout(c.about)}'`).join('\n');
  const cases = commands
    .map((c) => {
      const options = c.options.map(
        (o) =>
          `'${o.flag}${o.takesValue ? '=' : ''}[${zshAbout(o.about)}]${o.takesValue ? (o.choices.length > 0 ? `:value:(${o.choices.join(' ')})` : ':value:_files') : ''}'`,
      );
      const files = c.takesFiles ? `'*:file:_files'` : '';
      const rest = c.name === 'completion' ? `'1:shell:(${SHELLS.join(' ')})'` : files;
      return `    ${c.name}) _arguments ${options.join(' ')} ${rest} ;;`;
    })
    .join('\n');
  return `#compdef steelyard
# zsh completion for steelyard
_steelyard() {
  local -a commands
  commands=(
${list}
  )
  if (( CURRENT == 2 )); then
    _describe 'command' commands
    return
  fi
  local command=$words[2]
  shift words
  (( CURRENT-- ))
  case $command in
${cases}
  esac
}
_steelyard "$@"
`;
}

function fish(commands: readonly Known[]): string {
  const names = commands.map((c) => c.name).join(' ');
  const lines = commands.flatMap((c) => [
    `complete -c steelyard -n '__fish_use_subcommand' -f -a ${c.name} -d '${quoted(c.about)}'`,
    ...c.options.map(
      (o) =>
        `complete -c steelyard -n '__fish_seen_subcommand_from ${c.name}' -l ${o.flag.replace(/^--/, '')} ${o.takesValue ? '-r ' : ''}${o.choices.length > 0 ? `-f -a '${o.choices.join(' ')}' ` : ''}-d '${quoted(o.about)}'`,
    ),
  ]);
  return `# fish completion for steelyard (${names})
${lines.join('\n')}
complete -c steelyard -n '__fish_seen_subcommand_from completion' -f -a '${SHELLS.join(' ')}'
`;
}
