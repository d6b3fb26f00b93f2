/** How the page is lit: as the system says, or fixed. */
export const THEMES = ['system', 'light', 'dark'] as const;
export type Theme = (typeof THEMES)[number];

/** Where the choice is kept. The script in app.html reads it before anything is drawn. */
const KEY = 'theme';

/** The theme in force on this page. */
export function currentTheme(): Theme {
	return THEMES.find((it) => it === document.documentElement.dataset.theme) ?? 'system';
}

/** Takes a theme and remembers it on this device, where the device lets us. */
export function takeTheme(theme: Theme): void {
	if (theme === 'system') delete document.documentElement.dataset.theme;
	else document.documentElement.dataset.theme = theme;
	try {
		if (theme === 'system') localStorage.removeItem(KEY);
		else localStorage.setItem(KEY, theme);
	} catch {
		// Storage is shut (private browsing): the choice lasts as long as the page.
	}
}
