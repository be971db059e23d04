export { chartTallies, keysOfReturns, unchartTallies } from "./chart-tallies";
export { effectiveAwaited, effectiveDenominator, isAnswered, joinDenominator } from "./effective";
export { refuseImpossible } from "./figures-check";
export { getTallyHistory } from "./get-tally-history";
export { keyTable, type TallyKey } from "./keys";
export { contentOf, loadLines, returnLineOf, siblingsOf, tallyReply, type Line } from "./lines";
export {
  hospitalDay,
  lockReturn,
  openReturns,
  readReturn,
  returnNotFound,
  wardWithReturn,
  type HospitalDay,
  type ReturnRow,
} from "./return-row";
export { actorIdOf, addRevisions, type RevisionFacts, type RevisionKey } from "./revisions";
export { findLine, saveTally } from "./save-tally";
export { writeLine, type WrittenLine } from "./write-line";
