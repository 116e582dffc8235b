/** A project's name as its part of addresses: small letters, digits and hyphens. */
export function slugOf(name: string): string {
  return name
    .normalize('NFKD')
    .replace(/\p{M}/gu, '')
    .toLowerCase()
    .replace(/[^a-z0-9]+/g, '-')
    .slice(0, 60)
    .replace(/^-|-$/g, '');
}

export function slugFault(slug: string): string | undefined {
  if (slug === '') return 'Write how the project is called in addresses.';
  return /^[a-z0-9](?:[a-z0-9-]{0,58}[a-z0-9])?$/.test(slug)
    ? undefined
    : 'Take small letters, digits and hyphens, neither first nor last a hyphen.';
}
