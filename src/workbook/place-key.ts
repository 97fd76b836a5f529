/** One cell of a book as a key: names of sheets and addresses do not differ by case. */
export function placeKey(sheet: string, reference: string): string {
  return `${sheet}!${reference}`.toUpperCase();
}
