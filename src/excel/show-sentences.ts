import { makeErrorsWith } from "../cells/errors/cell-error";

// Excel shows the sentence of an error only when the error is of its own kind.
makeErrorsWith((code, sentence) => {
  const kind = code === "#N/A" ? CustomFunctions.ErrorCode.notAvailable : CustomFunctions.ErrorCode.invalidValue;
  return new CustomFunctions.Error(kind, sentence) as unknown as Error; // it is thrown, never shown by us; its type says less than an Error's
});
