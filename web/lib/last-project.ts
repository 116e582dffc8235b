const KEY = 'steelyard.project';

/** The project last looked at in this tab: where the masthead leads from pages that belong to none. */
export function lastProject(): string | null {
  try {
    return sessionStorage.getItem(KEY);
  } catch {
    return null;
  }
}

export function keepLastProject(slug: string): void {
  try {
    sessionStorage.setItem(KEY, slug);
  } catch {
    // Shut off: the first project of the list will do.
  }
}
