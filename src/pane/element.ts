type Attributes = Readonly<Record<string, string | boolean | ((event: never) => void)>>;

/**
 * Makes an element. Text children become text nodes, never markup, so nothing a cell holds can turn into a page. A function is
 * taken as a listener for the event of that name; `true` sets an empty attribute, `false` none.
 */
export function element<K extends keyof HTMLElementTagNameMap>(tag: K, attributes: Attributes = {}, ...children: readonly (Node | string)[]): HTMLElementTagNameMap[K] {
  const made = document.createElement(tag);
  for (const [name, value] of Object.entries(attributes)) {
    if (typeof value === "function") made.addEventListener(name, value as EventListener);
    else if (value === true) made.setAttribute(name, "");
    else if (value !== false) made.setAttribute(name, value);
  }
  made.append(...children);
  return made;
}
