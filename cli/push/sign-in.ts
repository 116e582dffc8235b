import { plainText } from '#core/figures/index.ts';
import type { Context } from '../commands/context.ts';
import { EXIT } from '../exit-status.ts';
import { Client } from './client.ts';
import { Patience } from './patience.ts';
import { readSecret } from './read-secret.ts';
import { checkToken, type PushOptions, readDestination } from './settings.ts';
import { forgetSignedIn, readSignedIn, writeSignedIn } from './signed-in-file.ts';
import { Trouble } from './trouble.ts';

/** `steelyard sign-in`: a token from the keyboard or a pipe, tried at the server, kept for its owner alone. */
export async function signIn(options: PushOptions & { forget?: boolean }, context: Context): Promise<void> {
  const { io } = context;
  const say = (text: string) => {
    if (!context.quiet) io.err(`${plainText(text)}\n`);
  };
  if (options.forget) {
    say(
      forgetSignedIn(io.env)
        ? 'signed out here; the token itself lives until it is revoked'
        : 'nobody was signed in',
    );
    return;
  }
  const destination = readDestination(options, io.env, readSignedIn(io.env));
  const { server, project: slug } = destination;
  const token = checkToken(
    await readSecret(io, `token for project ${slug} on ${server}: `),
    'what was entered',
  );
  const settings = { ...destination, token, tokenFrom: 'the one entered', retries: options.retries };
  try {
    const project = await new Client(settings, new Patience(options.retries, io.env)).showProject();
    const path = writeSignedIn({ ...destination, token }, io.env);
    say(`signed in to ${server}, project ${project.name}, as ${project.role}; kept in ${path}`);
    if (io.env.STEELYARD_TOKEN) say('STEELYARD_TOKEN is set, and goes before what is kept');
  } catch (error) {
    if (!(error instanceof Trouble)) throw error;
    const { reportFaults } = await import('../program.ts');
    reportFaults([error.fault], context);
    io.err('nothing was kept\n');
    context.status = EXIT.unsent;
  }
}
