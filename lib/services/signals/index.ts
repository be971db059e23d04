export {
  findSignals,
  listSignals,
  signalReply,
  signalsOfSeries,
  type ListedSignal,
  type Signal,
} from "./queries";
export { listSignalsInWords, type SignalInWords } from "./signals-in-words";
