import type { Dialogs } from "./dialogs";
import type { GridLibrary, GridModel, OwlLibrary } from "./grid-library";

/** Draws the grid for a book inside `target`, light or dark as the system asks. */
export async function mountGrid(owl: OwlLibrary, library: GridLibrary, model: GridModel, target: HTMLElement, dialogs: Dialogs): Promise<{ destroy(): void }> {
  const dark = matchMedia("(prefers-color-scheme: dark)");
  const theme = () => (dark.matches ? "dark" : "light");
  document.documentElement.dataset.bsTheme = theme();
  const app = new owl.App(library.Spreadsheet, {
    props: { model, colorScheme: theme(), ...dialogs },
    env: { loadLocales: async () => library.DEFAULT_LOCALES },
    warnIfNoStaticProps: false,
  });
  await app.mount(target);
  return app;
}
