export { checkImport } from "./check-import";
export { commitImport } from "./commit-import";
export { makeTemplate } from "./make-template";
export { getImport, listImportRows, listImports, type ShownRow } from "./queries";
export { takeBackImport } from "./take-back-import";
