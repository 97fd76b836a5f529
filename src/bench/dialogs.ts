import { element } from "../pane/element";

/** How the grid speaks to the user: notices in the page's live region, questions and errors in a modal dialog. */
export interface Dialogs {
  notifyUser(notification: { text: string; sticky: boolean }): void;
  raiseError(text: string, callback?: () => void): void;
  askConfirmation(text: string, confirm: () => void, cancel?: () => void): void;
}

const NOTICE_MILLISECONDS = 8000;

export function dialogs(notice: HTMLElement): Dialogs {
  let timer: ReturnType<typeof setTimeout> | undefined;
  return {
    notifyUser({ text, sticky }) {
      clearTimeout(timer);
      notice.textContent = text;
      if (!sticky) timer = setTimeout(() => (notice.textContent = ""), NOTICE_MILLISECONDS);
    },
    raiseError: (text, callback) => ask(text, ["OK"], () => callback?.()),
    askConfirmation: (text, confirm, cancel) => ask(text, ["OK", "Cancel"], (answer) => (answer === "OK" ? confirm() : cancel?.())),
  };
}

function ask(text: string, answers: readonly string[], then: (answer: string) => void): void {
  const before = document.activeElement;
  const words = element("p", { id: "bench-dialog-words" }, text);
  const form = element("form", { method: "dialog" }, ...answers.map((answer) => element("button", { value: answer }, answer)));
  const dialog = element("dialog", { class: "bench-dialog", "aria-labelledby": "bench-dialog-words" }, words, form);
  dialog.addEventListener("close", () => {
    dialog.remove();
    if (before instanceof HTMLElement) before.focus();
    then(dialog.returnValue);
  });
  // The grid listens for keys on the whole page.
  dialog.addEventListener("keydown", (event) => event.stopPropagation());
  document.body.append(dialog);
  dialog.showModal();
}
