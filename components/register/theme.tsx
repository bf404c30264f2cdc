'use client';

import { useSyncExternalStore } from 'react';

const STORE = 'evenrun.theme';
const CHANGED = 'evenrun:theme';
const THEMES = ['system', 'light', 'dark'] as const;
type Theme = (typeof THEMES)[number];

/** Light, dark, or as the device has it; kept in this browser. */
export function ThemeSwitch() {
  const theme = useSyncExternalStore(subscribe, currentTheme, () => 'system' as const);
  return (
    <fieldset>
      <legend className="text-xs text-ink-soft">Appearance</legend>
      <div className="mt-1 flex rounded border border-edge">
        {THEMES.map((choice) => (
          <label
            key={choice}
            className="target flex flex-1 cursor-pointer items-center justify-center px-3 capitalize has-checked:bg-blue has-checked:text-blue-on has-focus-visible:outline-2 has-focus-visible:outline-offset-2 has-focus-visible:outline-blue"
          >
            <input
              type="radio"
              name="theme"
              className="sr-only"
              checked={theme === choice}
              onChange={() => chooseTheme(choice)}
            />
            {choice}
          </label>
        ))}
      </div>
    </fieldset>
  );
}

const BEFORE_FIRST_PAINT = `try{var t=localStorage.getItem('${STORE}');if(t==='light'||t==='dark')document.documentElement.dataset.theme=t}catch(e){}`;

/** Stands in <head>, so that the page never flashes in the other theme. */
export function ThemeScript() {
  return <script dangerouslySetInnerHTML={{ __html: BEFORE_FIRST_PAINT }} />;
}

function chooseTheme(theme: Theme) {
  const { dataset } = document.documentElement;
  if (theme === 'system') delete dataset.theme;
  else dataset.theme = theme;
  localStorage.setItem(STORE, theme);
  window.dispatchEvent(new Event(CHANGED));
}

function currentTheme(): Theme {
  const kept = localStorage.getItem(STORE);
  return THEMES.find((theme) => theme === kept) ?? 'system';
}

function subscribe(onChange: () => void) {
  window.addEventListener(CHANGED, onChange);
  window.addEventListener('storage', onChange);
  return () => {
    window.removeEventListener(CHANGED, onChange);
    window.removeEventListener('storage', onChange);
  };
}
