/** The three ways the page can be lit, and the cookie that remembers which. */
export const themes = [
  { value: "paper", label: "Light" },
  { value: "tar", label: "Tar" },
  { value: "system", label: "As the system" },
] as const;

export type Theme = (typeof themes)[number]["value"];

export const themeCookie = "theme";
const year = 60 * 60 * 24 * 365;
const changed = "themechange";

/** The theme a cookie names; whatever else it holds means "as the system". */
export function themeOf(cookie: string | undefined): Theme {
  return themes.find(({ value }) => value === cookie)?.value ?? "system";
}

/** Lights the page and remembers it for a year. In the browser only. */
export function applyTheme(theme: Theme): void {
  document.documentElement.dataset.theme = theme;
  document.cookie = `${themeCookie}=${theme}; path=/; max-age=${year}; samesite=lax`;
  window.dispatchEvent(new Event(changed));
}

/** Paper to tar and back, from whatever is showing now. */
export function toggleTheme(): void {
  const scheme = getComputedStyle(document.documentElement).colorScheme;
  const isDark =
    scheme === "light dark" ? window.matchMedia("(prefers-color-scheme: dark)").matches : scheme === "dark";
  applyTheme(isDark ? "paper" : "tar");
}

export function subscribeToTheme(listener: () => void): () => void {
  window.addEventListener(changed, listener);
  return () => window.removeEventListener(changed, listener);
}
