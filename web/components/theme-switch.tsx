import { useState } from 'react';
import { chooseTheme, chosenTheme, type Theme } from '#web/lib/theme.ts';

const THEMES: readonly { theme: Theme; name: string }[] = [
  { theme: 'system', name: 'As the system' },
  { theme: 'light', name: 'Light' },
  { theme: 'dark', name: 'Dark' },
];

/** Light, dark, or what the system says; kept in this browser. */
export function ThemeSwitch() {
  const [chosen, setChosen] = useState(chosenTheme);
  return (
    <fieldset className="themes">
      <legend>Theme</legend>
      {THEMES.map(({ theme, name }) => (
        <label key={theme}>
          <input
            type="radio"
            name="theme"
            checked={theme === chosen}
            onChange={() => {
              chooseTheme(theme);
              setChosen(theme);
            }}
          />
          {name}
        </label>
      ))}
    </fieldset>
  );
}
