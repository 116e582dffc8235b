import { InputError } from '#core/errors.ts';

/**
 * The address of a server as it is stored and compared: no slash at its end, no query.
 *
 * @param insecure whether http:// is accepted to another machine
 * @throws InputError CALL_SERVER
 */
export function serverAddress(text: string, insecure: boolean): string {
  const url = parse(text);
  if (!url || (url.protocol !== 'https:' && url.protocol !== 'http:'))
    throw fault(
      `expected the address of a server, found '${text.replace(/\/\/[^/@]*@/, '//')}'`,
      'for instance https://steelyard.example.org',
    );
  if (url.username || url.password)
    throw fault(
      `expected an address without a name or password in it, found one at ${url.host}`,
      'the token comes from STEELYARD_TOKEN or `steelyard sign-in`',
    );
  if (url.protocol === 'http:' && !insecure && !isLoopback(url.hostname))
    throw fault(
      `expected https:// to another machine, found http://${url.host}`,
      'without TLS anyone on the way can read the token and the records; --insecure accepts that',
    );
  return url.origin + url.pathname.replace(/\/+$/, '');
}

const isLoopback = (host: string): boolean =>
  host === 'localhost' || host.endsWith('.localhost') || host === '[::1]' || /^127(\.\d+){3}$/.test(host);

function parse(text: string): URL | null {
  try {
    return new URL(text);
  } catch {
    return null;
  }
}

const fault = (message: string, hint: string): InputError =>
  new InputError([{ code: 'CALL_SERVER', message, hint }]);
