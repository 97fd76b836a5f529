import { makeErrorsWith } from "../cells/errors/cell-error";

// Excel shows the sentence of an error only when the error is of its own kind.
makeErrorsWith(
  (code, sentence) =>
    new CustomFunctions.Error(code === "#N/A" ? CustomFunctions.ErrorCode.notAvailable : CustomFunctions.ErrorCode.invalidValue, sentence),
);
