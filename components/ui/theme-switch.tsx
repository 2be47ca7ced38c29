"use client";

import { useId, useSyncExternalStore } from "react";
import { applyTheme, subscribeToTheme, themeOf, themes, type Theme } from "@/components/ui/theme";

function currentTheme(): Theme {
  return themeOf(document.documentElement.dataset.theme);
}

/** Light · Tar · As the system. */
export function ThemeSwitch() {
  const name = useId();
  const theme = useSyncExternalStore(subscribeToTheme, currentTheme, () => "system" as Theme);
  return (
    <fieldset className="flex flex-wrap gap-x-2 text-label">
      <legend className="sr-only">Theme</legend>
      {themes.map(({ value, label }, index) => (
        <label
          key={value}
          className="flex min-h-6 items-center gap-2 text-ink-2 has-checked:font-semibold has-checked:text-copper"
        >
          {index > 0 && (
            <span aria-hidden="true" className="font-normal text-ink-3">
              ·
            </span>
          )}
          <input
            type="radio"
            name={name}
            value={value}
            checked={theme === value}
            onChange={() => applyTheme(value)}
            className="peer sr-only"
          />
          <span className="rounded outline-offset-2 outline-sea peer-focus-visible:outline-2">{label}</span>
        </label>
      ))}
    </fieldset>
  );
}
