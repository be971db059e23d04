export { correctTally } from "./correct-tally";
export { decideCorrection } from "./decide-correction";
export { listCorrections } from "./queries";
