export { currentActor } from "./current-actor";
export { authOptions, TOO_MANY_TRIES } from "./options";
export { forPage, pageCtx, publicPageCtx } from "./page-ctx";
export { safePath } from "./safe-path";
