export { parseReferenceFile, type ReferenceCase, type ReferenceFile } from "./case-format";
export { loadCases, type LoadedFile } from "./load-cases";
export { isPendingKind } from "./pending";
export { reportFolder, type FolderReport } from "./report-folder";
export { runCase, runFile, type CaseOutcome } from "./run-case";
