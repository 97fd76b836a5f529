/** A book in the browser's storage: the grid library's data form and the file name it goes by. */
export interface KeptBook {
  name: string;
  data: Record<string, unknown>;
}

const KEY = "wallsheet.book.1";

/** The book that was kept last; undefined where there is none or what is there cannot be read. */
export function keptBook(storage: Storage): KeptBook | undefined {
  const text = storage.getItem(KEY);
  if (text === null) return undefined;
  try {
    const kept = JSON.parse(text) as Partial<KeptBook>;
    return typeof kept.name === "string" && typeof kept.data === "object" && kept.data !== null ? { name: kept.name, data: kept.data } : undefined;
  } catch (error) {
    console.warn("The book in the browser's storage cannot be read.", error);
    return undefined;
  }
}

/** Keeps a book; false where the storage takes no more. */
export function keepBook(storage: Storage, book: KeptBook): boolean {
  try {
    storage.setItem(KEY, JSON.stringify(book));
    return true;
  } catch (error) {
    console.warn("The browser's storage did not take the book.", error);
    return false;
  }
}

/** Forgets the book that was kept. */
export function forgetBook(storage: Storage): void {
  storage.removeItem(KEY);
}
